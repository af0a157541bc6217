import { createStore, del, get, set, type UseStore } from "idb-keyval";
import type { Debrief } from "@/lib/testcards/debrief-types";

/** What one person has typed for one sortie, sent or not. `typed` keeps even what is no number yet. */
export type DebriefDraft = {
  id: string; // minted when the form was opened: the same debrief sent twice is one
  debrief: Debrief;
  typed: Record<string, string>;
  screen: number;
  savedAt: string;
  sentAt: string | null;
};

let opened: UseStore | undefined;
const store = () => {
  opened ??= createStore("greenarc-debrief", "drafts");
  return opened;
};

/** Keyed by person too: whoever else signs in on this phone does not see it. */
const draftKey = (person: string, sortie: string) => `draft/${person}/${sortie}`;
const packKey = (sortie: string) => `pack/${sortie}`;

export const debriefDrafts = {
  load: (person: string, sortie: string) => get<DebriefDraft>(draftKey(person, sortie), store()),
  save: (person: string, sortie: string, draft: DebriefDraft) => set(draftKey(person, sortie), draft, store()),
  remove: (person: string, sortie: string) => del(draftKey(person, sortie), store()),
  /** The sortie's cards as last fetched, so that a reload without a signal still shows the form. */
  loadPack: <Pack>(sortie: string) => get<Pack>(packKey(sortie), store()),
  savePack: <Pack>(sortie: string, pack: Pack) => set(packKey(sortie), pack, store()),
};

export type DebriefDrafts = typeof debriefDrafts;
