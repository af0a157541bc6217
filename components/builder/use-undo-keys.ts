"use client";
import { type Dispatch, useEffect } from "react";
import type { BuilderAction } from "./builder-state";

/** Ctrl or Cmd with Z undoes, with Shift Z or Y does again, wherever the focus is. */
export function useUndoKeys(dispatch: Dispatch<BuilderAction>): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      const key = event.key.toLowerCase();
      if (key !== "z" && key !== "y") return;
      event.preventDefault();
      dispatch({ type: key === "y" || event.shiftKey ? "redo" : "undo" });
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, [dispatch]);
}
