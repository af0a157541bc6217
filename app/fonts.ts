import localFont from "next/font/local";

/** B612, drawn for cockpit displays; its licence stands in fonts/OFL.txt. */
export const b612 = localFont({
  src: [
    { path: "../fonts/b612-latin-400-normal.woff2", weight: "400", style: "normal" },
    { path: "../fonts/b612-latin-700-normal.woff2", weight: "700", style: "normal" },
  ],
  variable: "--font-b612",
  display: "swap",
});

/** Only for codes and hashes. */
export const b612Mono = localFont({
  src: [
    { path: "../fonts/b612-mono-latin-400-normal.woff2", weight: "400", style: "normal" },
    { path: "../fonts/b612-mono-latin-700-normal.woff2", weight: "700", style: "normal" },
  ],
  variable: "--font-b612-mono",
  display: "swap",
  preload: false,
});

export const fontVariables = `${b612.variable} ${b612Mono.variable}`;
