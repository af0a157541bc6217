"use client";
import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { useFieldArray, useForm } from "react-hook-form";
import { v7 as newId } from "uuid";
import type { z } from "zod";
import { Field } from "@/components/form/field";
import { FormMessage } from "@/components/form/form-message";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import { Input } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import { type CardState, SORTIE_KINDS, type SortieKind } from "@/lib/testcards/words";
import { PlanSortieInput } from "@/lib/workflow/sortie/schema";
import { asNumber, DAY_PLAN } from "./loading-words";

type Offered = {
  id: string;
  name: string;
  kind: string;
  revisionId: string;
  letter: string;
  state: CardState;
  loading: { crew: { role: string; massKg: number }[]; fuelOnBoardL: number | null; baggageKg: number };
};
type SortieFormProps = {
  programmeId: string;
  today: string;
  cards: Offered[];
  configurations: { id: string; number: string; isCurrent: boolean; signed: boolean }[];
  pilots: { id: string; name: string }[];
  planned?: { id: string; version: number; values: Typed }; // to be changed; else a new one
};

type Typed = z.input<typeof PlanSortieInput>;
type Plan = z.output<typeof PlanSortieInput>;

/** Kind, day, crew, configuration and cards, by the same schema as the server's. */
export function SortieForm({ programmeId, today, cards, configurations, pilots, planned }: SortieFormProps) {
  const router = useRouter();
  const key = useRef("");
  const [problem, setProblem] = useState<string | null>(null);
  const first = pilots[0];
  const { register, control, handleSubmit, formState, setError, setValue, getValues, watch } = useForm<Typed, unknown, Plan>({
    resolver: zodResolver(PlanSortieInput),
    defaultValues: planned?.values ?? {
      programmeId,
      kind: "flight",
      plannedOn: today,
      configurationId: configurations.find(({ isCurrent }) => isCurrent)?.id ?? null,
      crew: [{ userId: first?.id ?? null, name: first?.name ?? "", role: "pilot", massKg: Number.NaN }],
      revisionIds: [],
      settings: { baggageKg: 0, fuelOnBoardL: null, forecastOatC: null, dayPlan: { daylight: null, dutyTime: null, runway: null } },
    },
  });
  const crew = useFieldArray({ control, name: "crew" });
  const { errors, isSubmitting } = formState;
  const kind = watch("kind") as SortieKind;
  const sorted = [...cards].sort(
    (a, b) => Number(b.kind === kind) - Number(a.kind === kind) || Number(b.state === "released") - Number(a.state === "released"),
  );

  const send = handleSubmit(async (plan) => {
    key.current ||= newId();
    setProblem(null);
    const { programmeId: _path, ...body } = plan;
    const sorties = `/programmes/${programmeId}/sorties`;
    const answer = planned
      ? await callApi<{ id: string }>(`/sorties/${planned.id}`, { method: "PATCH", body, ifMatch: planned.version })
      : await callApi<{ id: string }>(sorties, { method: "POST", body, idempotencyKey: key.current });
    if (answer.ok) {
      router.push(`${sorties}/${answer.body.id}`);
      return router.refresh();
    }
    key.current = "";
    setProblem(answer.problem.status === 0 ? "No connection: nothing was saved. Your entries are kept; try again." : answer.problem.detail);
    for (const { path, message } of answer.problem.errors) setError(path as "kind", { message });
  });

  /** The first card ticked says what it was planned with; what was typed already stays. All cards share one field: the event names the card. */
  const takeLoading = (revisionId: string, on: boolean) => {
    const loading = cards.find((card) => card.revisionId === revisionId)?.loading;
    const { crew: people, settings } = getValues();
    if (!on || !loading || planned) return;
    const seat = people[0];
    if (seat && people.length === 1 && !Number.isFinite(Number(seat.massKg)))
      setValue("crew", [
        { ...seat, massKg: loading.crew[0]?.massKg ?? Number.NaN },
        ...loading.crew.slice(1).map(({ role, massKg }) => ({ userId: null, name: role, role: "observer" as const, massKg })),
      ]);
    if (settings?.fuelOnBoardL === null) setValue("settings.fuelOnBoardL", loading.fuelOnBoardL);
    if (settings?.baggageKg === 0) setValue("settings.baggageKg", loading.baggageKg);
  };

  return (
    <form onSubmit={send} noValidate className="flex max-w-3xl flex-col gap-6">
      <div className="grid gap-4 hand:grid-cols-3">
        <Field name="kind" label="Kind" required error={errors.kind?.message}>
          {(props) => (
            <Select {...props} {...register("kind")}>
              {SORTIE_KINDS.map((one) => (
                <option key={one}>{one}</option>
              ))}
            </Select>
          )}
        </Field>
        <Field name="plannedOn" label="Day, UTC" required error={errors.plannedOn?.message}>
          {(props) => <Input type="date" {...props} {...register("plannedOn")} />}
        </Field>
        <Field name="configurationId" label="Configuration" required error={errors.configurationId?.message}>
          {(props) => (
            <Select {...props} {...register("configurationId", { setValueAs: (value) => value || null })}>
              {configurations.map(({ id, number, isCurrent, signed }) => (
                <option key={id} value={id}>
                  {number}
                  {isCurrent ? ", current" : ", earlier"}
                  {signed ? "" : ", not signed"}
                </option>
              ))}
            </Select>
          )}
        </Field>
      </div>

      <fieldset className="flex flex-col gap-2">
        <legend className="mb-1 font-bold">Cards, in the order they are flown</legend>
        {cards.length === 0 ? <p className="text-ink-soft">No cards yet. Build one first.</p> : null}
        {sorted.map(({ id, name, kind: cardKind, revisionId, letter, state }) => (
          <label key={id} className="flex min-h-11 items-center gap-3 border-rule border-b">
            <input
              type="checkbox"
              value={revisionId}
              {...register("revisionIds", { onChange: (event) => takeLoading(event.target.value, event.target.checked) })}
              className="size-5 accent-spine"
            />
            <span className="grow">
              {name}, rev {letter}
            </span>
            <span className="text-ink-soft text-sm">
              {cardKind}, {state}
            </span>
          </label>
        ))}
        {errors.revisionIds?.message ? (
          <p role="alert" className="font-bold text-ink-red text-sm">
            {errors.revisionIds.message}
          </p>
        ) : null}
      </fieldset>

      <fieldset className="flex flex-col gap-3">
        <legend className="mb-1 font-bold">Crew</legend>
        {crew.fields.map((member, index) => (
          <div key={member.id} className="grid items-start gap-3 hand:grid-cols-[1fr_9rem_8rem_auto]">
            {index === 0 && pilots.length > 0 ? (
              <Field name={`crew.${index}.userId`} label="Pilot" required error={errors.crew?.[index]?.name?.message}>
                {(props) => (
                  <Select
                    {...props}
                    defaultValue={first?.id}
                    onChange={(event) => {
                      const pilot = pilots.find(({ id }) => id === event.target.value);
                      if (pilot) crew.update(index, { ...watch(`crew.${index}`), userId: pilot.id, name: pilot.name });
                    }}
                  >
                    {pilots.map(({ id, name }) => (
                      <option key={id} value={id}>
                        {name}
                      </option>
                    ))}
                  </Select>
                )}
              </Field>
            ) : (
              <Field name={`crew.${index}.name`} label="Name" required error={errors.crew?.[index]?.name?.message}>
                {(props) => <Input {...props} {...register(`crew.${index}.name`)} maxLength={80} />}
              </Field>
            )}
            <Field name={`crew.${index}.role`} label="Seat" required error={errors.crew?.[index]?.role?.message}>
              {(props) => (
                <Select {...props} {...register(`crew.${index}.role`)}>
                  <option value="pilot">pilot</option>
                  <option value="observer">observer</option>
                </Select>
              )}
            </Field>
            <Field name={`crew.${index}.massKg`} label="Mass, kg" required error={errors.crew?.[index]?.massKg?.message}>
              {(props) => (
                <Input
                  inputMode="numeric"
                  {...props}
                  {...register(`crew.${index}.massKg`, { setValueAs: (value) => asNumber(value) ?? Number.NaN })}
                />
              )}
            </Field>
            {index > 0 ? (
              <Button variant="quiet" className="self-end" onClick={() => crew.remove(index)}>
                Remove
              </Button>
            ) : null}
          </div>
        ))}
        {errors.crew?.root?.message || errors.crew?.message ? (
          <p role="alert" className="font-bold text-ink-red text-sm">
            {errors.crew.root?.message ?? errors.crew.message}
          </p>
        ) : null}
        <Button className="self-start" onClick={() => crew.append({ userId: null, name: "", role: "observer", massKg: Number.NaN })}>
          Add an observer
        </Button>
      </fieldset>

      <div className="grid items-end gap-4 hand:grid-cols-3">
        <Field name="settings.fuelOnBoardL" label="Fuel on board, L" error={errors.settings?.fuelOnBoardL?.message}>
          {(props) => <Input inputMode="decimal" {...props} {...register("settings.fuelOnBoardL", { setValueAs: asNumber })} />}
        </Field>
        <Field name="settings.baggageKg" label="Baggage, kg" required error={errors.settings?.baggageKg?.message}>
          {(props) => (
            <Input inputMode="decimal" {...props} {...register("settings.baggageKg", { setValueAs: (value) => asNumber(value) ?? 0 })} />
          )}
        </Field>
        <Field name="settings.forecastOatC" label="Forecast outside air, °C" error={errors.settings?.forecastOatC?.message}>
          {(props) => <Input inputMode="decimal" {...props} {...register("settings.forecastOatC", { setValueAs: asNumber })} />}
        </Field>
        {(["daylight", "dutyTime", "runway"] as const).map((one) => (
          <Field key={one} name={`settings.dayPlan.${one}`} label={DAY_PLAN[one]} error={errors.settings?.dayPlan?.[one]?.message}>
            {(props) => (
              <Input {...props} maxLength={120} {...register(`settings.dayPlan.${one}`, { setValueAs: (value) => value || null })} />
            )}
          </Field>
        ))}
      </div>
      <FormMessage message={problem} />
      <Button type="submit" variant="main" className="self-start" disabled={isSubmitting}>
        {isSubmitting ? "Saving …" : planned ? "Save the change" : "Plan the sortie"}
      </Button>
    </form>
  );
}
