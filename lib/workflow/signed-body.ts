import { z } from "zod";
import { digest } from "./fields";

/** What comes with a signature: the digest of what was shown, and the password asked again. */
export const SignedBody = z.strictObject({
  password: z.string("Type your password again.").min(1, "Type your password again.").max(200, "That is longer than any password here."),
  digest,
});
