import Link from "next/link";
import { buttonClass } from "@/components/ui/button";

export default function NotFound() {
  return (
    <main className="mx-auto flex w-full max-w-3xl flex-col items-start gap-3 px-4 py-12">
      <h1 className="font-bold text-2xl">Not found</h1>
      <p className="text-ink-soft">There is nothing at this address, or it belongs to another team.</p>
      <Link href="/" className={buttonClass("main", "mt-3")}>
        To the flight line
      </Link>
    </main>
  );
}
