"use client";
import { signIn } from "next-auth/react";
import { useActionState, useRef } from "react";
import { Field } from "@/components/form/field";
import { FormMessage } from "@/components/form/form-message";
import { SubmitButton } from "@/components/form/submit-button";
import { Input } from "@/components/ui/input";

type State = { message: string | null; email: string; errors: { email?: string; password?: string } };
type Demo = { people: { email: string; roles: string[] }[]; password: string } | null;

function waitWords(error: string): string {
  const seconds = Number(error.split(":")[1]);
  const wait = seconds < 90 ? `${seconds} s` : `${Math.ceil(seconds / 60)} min`;
  return `Too many tries. Wait ${wait}, then try again.`;
}

async function tryToSignIn(form: FormData, next: string, refused: string): Promise<State> {
  const email = String(form.get("email") ?? "").trim();
  const password = String(form.get("password") ?? "");
  const errors: State["errors"] = {};
  if (!email.includes("@")) errors.email = "Enter your e-mail address, such as name@example.org.";
  if (password === "") errors.password = "Enter your password.";
  if (errors.email || errors.password) return { message: null, email, errors };
  const answer = await signIn("credentials", { redirect: false, email, password }).catch(() => undefined);
  if (!answer) return { message: "The server did not answer. Check the connection, then try again.", email, errors };
  if (answer.error) return { message: answer.error.startsWith("TooManyTries") ? waitWords(answer.error) : refused, email, errors };
  window.location.assign(next);
  return { message: null, email, errors };
}

export function SignInForm({ next, refused, demo }: { next: string; refused: string; demo: Demo }) {
  const form = useRef<HTMLFormElement>(null);
  const [state, submit] = useActionState<State, FormData>((_, data) => tryToSignIn(data, next, refused), {
    message: null,
    email: "",
    errors: {},
  });
  const fill = (email: string, password: string) => {
    const fields = form.current?.elements;
    for (const [name, value] of [
      ["email", email],
      ["password", password],
    ] as const) {
      const field = fields?.namedItem(name);
      if (field instanceof HTMLInputElement) field.value = value;
    }
    form.current?.requestSubmit();
  };
  return (
    <div className="flex flex-col gap-8">
      <form ref={form} action={submit} noValidate className="flex flex-col gap-4 border border-rule bg-sheet p-5">
        <h2 className="font-bold text-xl">Sign in</h2>
        <FormMessage message={state.message} />
        <Field name="email" label="E-mail" required error={state.errors.email}>
          {(props) => <Input {...props} type="email" autoComplete="username" defaultValue={state.email} maxLength={254} />}
        </Field>
        <Field name="password" label="Password" required error={state.errors.password}>
          {(props) => <Input {...props} type="password" autoComplete="current-password" maxLength={200} />}
        </Field>
        <SubmitButton waiting="Signing in">Sign in</SubmitButton>
      </form>
      {demo ? <DemoSignIns demo={demo} onChoose={fill} /> : null}
    </div>
  );
}

function DemoSignIns({ demo, onChoose }: { demo: NonNullable<Demo>; onChoose: (email: string, password: string) => void }) {
  return (
    <section aria-labelledby="demo-title">
      <h2 id="demo-title" className="font-bold">
        Demo sign-ins
      </h2>
      <p className="pb-2 text-ink-soft text-sm">
        All with the password <code className="font-mono">{demo.password}</code>. Everything in the demo is invented.
      </p>
      <ul>
        {demo.people.map(({ email, roles }) => (
          <li key={email} className="border-rule border-t">
            <button
              type="button"
              onClick={() => onChoose(email, demo.password)}
              className="flex min-h-11 w-full items-center justify-between gap-4 px-1 text-start hover:bg-wash-grey"
            >
              <span className="font-bold">{roles.join(", ")}</span>
              <span className="break-all text-end text-ink-soft text-sm">{email}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
