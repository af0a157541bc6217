"use client";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import { Textarea } from "@/components/ui/textarea";
import { formatInstant } from "@/lib/format/time";
import type { CardPoint } from "@/lib/testcards/card";

export type Remark = {
  id: string;
  letter: string;
  pointId: string | null;
  text: string;
  isReturn: boolean;
  authorName: string;
  createdAt: string;
};

type DiscussionProps = { cardId: string; comments: Remark[]; points: CardPoint[]; selected: string | null; may: boolean };

/** What was said in review, oldest first, about the card or the point that is selected. */
export function Discussion({ cardId, comments, points, selected, may }: DiscussionProps) {
  const nameOf = (id: string) => {
    const index = points.findIndex((point) => point.id === id);
    return index < 0 ? "a point since taken off" : `point ${index + 1}, ${points[index]?.title ?? ""}`;
  };
  return (
    <section aria-label="Review comments">
      <h2 className="font-bold text-lg">Said in review</h2>
      {comments.length === 0 ? <p className="mt-1 text-ink-soft">Nothing yet.</p> : null}
      <ol>
        {comments.map((comment) => (
          <li key={comment.id} className="border-rule border-b py-3">
            <p className="text-ink-soft text-sm">
              {comment.authorName}, {formatInstant(comment.createdAt)}, rev {comment.letter}
              {comment.pointId ? `, on ${nameOf(comment.pointId)}` : ""}
              {comment.isReturn ? ", returned" : ""}
            </p>
            <p className="whitespace-pre-wrap break-words">{comment.text}</p>
          </li>
        ))}
      </ol>
      {may ? <CommentForm cardId={cardId} point={selected} about={selected ? nameOf(selected) : "the card"} /> : null}
    </section>
  );
}

function CommentForm({ cardId, point, about }: { cardId: string; point: string | null; about: string }) {
  const router = useRouter();
  const [text, setText] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  async function send(event: FormEvent) {
    event.preventDefault();
    if (text.trim() === "") return setProblem("Write the comment first.");
    setBusy(true);
    const answer = await callApi(`/cards/${cardId}/comments`, {
      method: "POST",
      body: { pointId: point, text },
      idempotencyKey: crypto.randomUUID(),
    });
    setBusy(false);
    if (!answer.ok) return setProblem(answer.problem.errors[0]?.message ?? answer.problem.detail);
    setText("");
    setProblem(null);
    router.refresh();
  }
  return (
    <form onSubmit={send} className="mt-3 flex flex-col gap-2">
      <label htmlFor="comment" className="text-sm">
        Comment on {about}
      </label>
      <Textarea
        id="comment"
        value={text}
        maxLength={2000}
        rows={3}
        onChange={(event) => setText(event.target.value)}
        aria-invalid={problem ? true : undefined}
      />
      {problem ? (
        <p role="alert" className="text-ink-red">
          {problem}
        </p>
      ) : null}
      <Button type="submit" disabled={busy}>
        {busy ? "Sending …" : "Comment"}
      </Button>
    </form>
  );
}
