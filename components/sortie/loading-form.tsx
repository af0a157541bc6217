"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import type { z } from "zod";
import { Field } from "@/components/form/field";
import { FormMessage } from "@/components/form/form-message";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import { Input } from "@/components/ui/input";
import { EnterLoadingInput } from "@/lib/workflow/sortie/schema";
import { asNumber, DAY_PLAN } from "./loading-words";

type Typed = z.input<typeof EnterLoadingInput>;
type Loading = z.output<typeof EnterLoadingInput>;

/** Fuel, baggage, forecast and the day's plan, by the pilot who flies; a briefed sortie is then briefed again. */
export function LoadingForm({
  sortieId,
  version,
  settings,
}: {
  sortieId: string;
  version: number;
  settings: NonNullable<Typed["settings"]>;
}) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const { register, handleSubmit, formState, setError } = useForm<Typed, unknown, Loading>({
    resolver: zodResolver(EnterLoadingInput),
    defaultValues: { sortieId, version, settings },
  });
  const { errors, isSubmitting } = formState;
  const send = handleSubmit(async (loading) => {
    setProblem(null);
    const sent = await callApi(`/sorties/${sortieId}/loading`, { method: "PUT", body: { settings: loading.settings }, ifMatch: version });
    if (sent.ok) return router.refresh();
    setProblem(sent.problem.detail);
    for (const { path, message } of sent.problem.errors) setError(path as "settings", { message });
  });
  return (
    <form onSubmit={send} noValidate className="mt-3 flex flex-col gap-4">
      <div className="grid items-end gap-4 hand:grid-cols-3">
        <Field name="settings.fuelOnBoardL" label="Fuel on board, L" required error={errors.settings?.fuelOnBoardL?.message}>
          {(props) => <Input inputMode="decimal" {...props} {...register("settings.fuelOnBoardL", { setValueAs: asNumber })} />}
        </Field>
        <Field name="settings.baggageKg" label="Baggage, kg" required error={errors.settings?.baggageKg?.message}>
          {(props) => (
            <Input inputMode="decimal" {...props} {...register("settings.baggageKg", { setValueAs: (value) => asNumber(value) ?? 0 })} />
          )}
        </Field>
        <Field name="settings.forecastOatC" label="Forecast outside air, °C" required error={errors.settings?.forecastOatC?.message}>
          {(props) => <Input inputMode="decimal" {...props} {...register("settings.forecastOatC", { setValueAs: asNumber })} />}
        </Field>
        {(["daylight", "dutyTime", "runway"] as const).map((one) => (
          <Field key={one} name={`settings.dayPlan.${one}`} label={DAY_PLAN[one]} required error={errors.settings?.dayPlan?.[one]?.message}>
            {(props) => (
              <Input {...props} maxLength={120} {...register(`settings.dayPlan.${one}`, { setValueAs: (value) => value || null })} />
            )}
          </Field>
        ))}
      </div>
      <FormMessage message={problem} />
      <Button type="submit" className="self-start" disabled={isSubmitting}>
        {isSubmitting ? "Saving …" : "Save the loading"}
      </Button>
    </form>
  );
}
