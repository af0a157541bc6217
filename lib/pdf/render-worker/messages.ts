import type { KneeboardModel } from "@/lib/pdf/kneeboard/model";

export type RenderOrder = { id: number; model: KneeboardModel };
export type RenderAnswer = { id: number; pdf: Uint8Array } | { id: number; error: string };
