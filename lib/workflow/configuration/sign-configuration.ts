import { eq } from "drizzle-orm";
import { configurations, signatures } from "@/db/schema";
import { Refusal } from "../errors";
import { requireProof } from "../proof";
import { defineUseCase } from "../use-case";
import { getConfiguration } from "./queries";
import { SignConfigurationInput } from "./schema";

/** The mechanic signs that this is what is fitted, password asked again. */
export const signConfiguration = defineUseCase({
  name: "configuration.sign",
  permission: "sign configuration",
  input: SignConfigurationInput,
  run(tx, ctx, { configurationId, digest: shown }) {
    const { actor, now, newId } = ctx;
    const configuration = getConfiguration(tx, actor, configurationId);
    if (configuration.signedAt !== null)
      throw new Refusal("conflict", `Configuration ${configuration.number} is signed already. A change is a new configuration.`);
    if (configuration.digest !== shown)
      throw new Refusal("stale", "This configuration changed since it was shown. Read it again before you sign.");
    requireProof(ctx, configuration.digest);
    const signedAt = now.toISOString();
    const subject = `configuration/${configurationId}`;
    tx.update(configurations).set({ signedBy: actor.id, signedAt }).where(eq(configurations.id, configurationId)).run();
    tx.insert(signatures)
      .values({
        id: newId(),
        teamId: actor.teamId,
        subject,
        meaning: "signed configuration",
        digest: shown,
        signedBy: actor.id,
        name: actor.name,
        role: "mechanic",
        signedAt,
      })
      .run();
    return {
      out: { id: configurationId, number: configuration.number, signedAt },
      audit: { subject, before: { signed: false }, after: { signed: true, digest: shown } },
    };
  },
});
