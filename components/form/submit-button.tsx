"use client";
import type { ReactNode } from "react";
import { useFormStatus } from "react-dom";
import { Button, type ButtonVariant } from "@/components/ui/button";

/** Waits visibly and takes no second press while the form is under way. */
export function SubmitButton({
  children,
  waiting = "Sending",
  variant = "main",
  className,
  disabled = false,
}: {
  children: ReactNode;
  waiting?: string;
  variant?: ButtonVariant;
  className?: string;
  disabled?: boolean;
}) {
  const { pending } = useFormStatus();
  return (
    <Button type="submit" variant={variant} disabled={pending || disabled} {...(className ? { className } : {})}>
      {pending ? `${waiting} …` : children}
    </Button>
  );
}
