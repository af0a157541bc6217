import { Skeleton } from "@/components/ui/skeleton";

export default function Loading() {
  return (
    <main className="mx-auto w-full max-w-6xl px-4 py-8 desk:px-6">
      <p role="status" className="pb-4 text-ink-soft">
        Fetching …
      </p>
      <Skeleton lines={8} />
    </main>
  );
}
