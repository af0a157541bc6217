import { CircleAlert } from "lucide-react";
import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";

export type FieldProps = {
  id: string;
  name: string;
  "aria-invalid"?: true;
  "aria-describedby"?: string;
  required?: boolean;
};

/** Label, hint, control and error in that order; the control is given its id, name and descriptions. */
export function Field({
  name,
  id = name,
  label,
  hint,
  error,
  required = false,
  className,
  children,
}: {
  name: string;
  id?: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  required?: boolean;
  className?: string;
  children: (props: FieldProps) => ReactNode;
}) {
  const described = [hint ? `${id}-hint` : "", error ? `${id}-error` : ""].filter(Boolean).join(" ");
  return (
    <div className={classNames("flex flex-col gap-1.5", className)}>
      <label htmlFor={id} className="font-bold">
        {label}
        {required ? null : <span className="font-normal text-ink-soft"> (may be left empty)</span>}
      </label>
      {hint ? (
        <p id={`${id}-hint`} className="text-ink-soft text-sm">
          {hint}
        </p>
      ) : null}
      {children({
        id,
        name,
        ...(error ? { "aria-invalid": true as const } : {}),
        ...(described ? { "aria-describedby": described } : {}),
        ...(required ? { required } : {}),
      })}
      <FieldError id={`${id}-error`} message={error} />
    </div>
  );
}

export function FieldError({ id, message }: { id?: string; message: string | undefined | null }) {
  if (!message) return null;
  return (
    <p id={id} className="flex items-start gap-2 font-bold text-ink-red text-sm">
      <CircleAlert aria-hidden="true" className="mt-0.5 size-4 shrink-0" />
      {message}
    </p>
  );
}
