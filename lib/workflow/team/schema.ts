import { z } from "zod";
import { uuid } from "../fields";

export const EndSessionInput = z.strictObject({ sessionId: uuid });
export const EndAllSessionsInput = z.strictObject({});
