/** Which light the screen is read in: the system's, daylight, or ramp light for night. */
export const LIGHTS = ["system", "day", "ramp"] as const;
export type Light = (typeof LIGHTS)[number];

export const LIGHT_COOKIE = "light";
export const LIGHT_WORDS: Record<Light, string> = { system: "System", day: "Daylight", ramp: "Ramp light" };

export function readLight(cookie: string | undefined): Light {
  return LIGHTS.find((light) => light === cookie) ?? "system";
}

/** What stands on the html element; nothing where the system decides. */
export function lightAttribute(light: Light): { "data-light"?: Light } {
  return light === "system" ? {} : { "data-light": light };
}
