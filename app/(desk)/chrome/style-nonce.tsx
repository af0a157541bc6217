"use client";

declare global {
  var __webpack_nonce__: string | undefined;
}

/** Dialogs lock the page's scrolling through a style element; the policy wants this request's nonce on it. */
export function StyleNonce() {
  if (typeof document !== "undefined") globalThis.__webpack_nonce__ = document.querySelector<HTMLScriptElement>("script[nonce]")?.nonce;
  return null;
}
