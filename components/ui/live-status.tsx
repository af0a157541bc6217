"use client";
import { createContext, type ReactNode, useCallback, useContext, useEffect, useState } from "react";

type Notice = { id: number; text: string; tone: "plain" | "problem" };
type Say = (text: string, tone?: Notice["tone"]) => void;

const StatusContext = createContext<Say>(() => {});
const SHOWN_MS = 6000;

/** Says a short thing to eye and ear alike; problems stay until they are closed. */
export function useStatus(): Say {
  return useContext(StatusContext);
}

export function LiveStatus({ children }: { children: ReactNode }) {
  const [notices, setNotices] = useState<Notice[]>([]);
  const close = useCallback((id: number) => setNotices((all) => all.filter((notice) => notice.id !== id)), []);
  const say = useCallback<Say>((text, tone = "plain") => {
    setNotices((all) => [...all.slice(-2), { id: (all.at(-1)?.id ?? 0) + 1, text, tone }]);
  }, []);
  return (
    <StatusContext value={say}>
      {children}
      <div
        role="status"
        aria-live="polite"
        className="no-print fixed end-4 bottom-20 z-50 flex w-[min(24rem,calc(100vw-2rem))] flex-col gap-2 desk:bottom-4"
      >
        {notices.map((notice) => (
          <NoticeLine key={notice.id} notice={notice} onClose={() => close(notice.id)} />
        ))}
      </div>
    </StatusContext>
  );
}

function NoticeLine({ notice, onClose }: { notice: Notice; onClose: () => void }) {
  const stays = notice.tone === "problem";
  useEffect(() => {
    if (stays) return;
    const timer = setTimeout(onClose, SHOWN_MS);
    return () => clearTimeout(timer);
  }, [stays, onClose]);
  return (
    <div className="flex items-center justify-between gap-3 rounded-md bg-ink px-4 py-2 text-paper">
      <p>{notice.text}</p>
      <button type="button" onClick={onClose} className="min-h-11 rounded-md px-2 underline">
        Close
      </button>
    </div>
  );
}
