"use client";
import { useEffect } from "react";
import { Button } from "@/components/ui/button";

export default function DeskError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  useEffect(() => {
    console.error(error);
  }, [error]);
  return (
    <main className="mx-auto flex w-full max-w-3xl flex-col items-start gap-3 px-4 py-12">
      <h1 className="font-bold text-2xl">This page could not be made</h1>
      <p role="alert" className="text-ink-soft">
        Something went wrong on our side. Nothing you entered was half-written. Try again; if it stays, tell whoever runs this installation
        {error.digest ? (
          <>
            {" "}
            and quote <code className="font-mono">{error.digest}</code>
          </>
        ) : null}
        .
      </p>
      <Button variant="main" className="mt-3" onClick={reset}>
        Try again
      </Button>
    </main>
  );
}
