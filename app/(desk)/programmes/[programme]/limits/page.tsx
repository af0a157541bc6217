import type { Metadata } from "next";
import { StripKey } from "@/components/gauge/scale";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { getProgramme, listInstruments, listLimits, listParameters } from "@/lib/workflow/programme/queries";
import { orNotFound } from "../../../or-not-found";
import { BinderPage } from "../binder-page";
import { ParameterLimits } from "./parameter-limits";

export const metadata: Metadata = { title: "Limits" };

export default async function LimitsPage({ params }: { params: Promise<{ programme: string }> }) {
  const [{ db, actor }, { programme: id }] = await Promise.all([requestCtx(), params]);
  const { settings } = orNotFound(() => getProgramme(db, actor, id));
  const parameters = listParameters(db, actor, id);
  const limits = listLimits(db, actor, id);
  const instruments = listInstruments(db, actor, id);
  const limited = parameters.filter(({ code }) => limits.some((limit) => limit.parameter === code));
  return (
    <BinderPage>
      <PageHeader
        title="Limits"
        lead="In layers, each never looser than the one before it: placard, card, abort. True is what the fluid is; on the gauge is what the pilot reads, rounded to a mark on the cautious side. Only gauge numbers print on a sheet."
      />
      {limited.length === 0 ? (
        <EmptyState title="No limits yet">
          The engine's and the aircraft's placards stand here, with the card limits inside them.
        </EmptyState>
      ) : (
        <>
          <StripKey />
          <div className="pt-6">
            {limited.map((parameter) => (
              <ParameterLimits
                key={parameter.code}
                parameter={parameter}
                limits={limits.filter((limit) => limit.parameter === parameter.code)}
                instruments={instruments.filter((instrument) => instrument.parameter === parameter.code)}
                standingAborts={settings.standingAborts}
              />
            ))}
          </div>
        </>
      )}
    </BinderPage>
  );
}
