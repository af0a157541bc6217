import { z } from "zod";
import { digest, uuid } from "../fields";

/** `digest` is of what was shown; the proof of the password names the same one. */
export const SignConfigurationInput = z.strictObject({ configurationId: uuid, digest });
