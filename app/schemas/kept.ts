import { z } from "zod";
import { KEPT_KINDS } from "#app/lib/kept-kinds.ts";
import type { Preferences } from "#app/lib/preferences.ts";
import { keepsSearches } from "#app/lib/saved-list.ts";

/** A search of a list that is kept under a name. */
export interface SavedFilterRow {
  id: string;
  list: string;
  name: string;
  query: string;
}

/** What a person keeps for themselves and every page needs to know. */
export interface Mine {
  preferences: Preferences;
  /** marked records, each as 'kind id' */
  favourites: string[];
  filters: SavedFilterRow[];
}

/** A star that is pressed: which record, whether it is to be marked, and where to go back to without scripts. */
export const favouriteFormSchema = z.object({
  kind: z.enum(KEPT_KINDS),
  id: z.uuid(),
  marked: z.enum(["yes", "no"]),
  back: z.string().optional(),
});

/** A search to keep: of which list, under which name. */
export const savedFilterFormSchema = z.object({
  list: z.string().max(90).refine(keepsSearches),
  query: z.string().min(1).max(600),
  name: z.string().trim().min(1, "Give it a name.").max(60, "At most 60 characters."),
});
