import type { KindListData, KindPageData, KindRecordData, SiteFacts } from "#app/lib/kind-data.ts";
import { KIND_KEYS, kindOf, type KindSlug } from "#app/lib/library-kinds.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { siteLimits } from "../limits.server.ts";
import { listCarrierUnits } from "./carrier-units.server.ts";
import { getLibraryRecord, listLibraryAt } from "./library.server.ts";
import { tryPair } from "./pair.server.ts";
import { whereUsed } from "./use.server.ts";

/**
 * The kind that an address names.
 * @throws 404 for any other word
 */
export function requireKind(text: string | undefined): KindSlug {
  const slug = kindOf(text);
  if (slug === null) throw notFound("page");
  return slug;
}

async function siteFacts(scope: ActorScope): Promise<SiteFacts> {
  const limits = await siteLimits(scope);
  return { adhesiveMargin: limits.adhesiveMargin.value };
}

/** The page of a kind's list that an address asks for. */
export async function listKind<Slug extends KindSlug>(
  scope: ActorScope,
  slug: Slug,
  search: URLSearchParams,
): Promise<KindListData<Slug>> {
  const [list, site] = await Promise.all([listLibraryAt(scope, KIND_KEYS[slug], search), siteFacts(scope)]);
  return { slug, ...list, site };
}

/** One record of a kind. */
export async function getKindRecord<Slug extends KindSlug>(
  scope: ActorScope,
  slug: Slug,
  id: string | undefined,
): Promise<KindRecordData<Slug>> {
  return { slug, ...(await getLibraryRecord(scope, KIND_KEYS[slug], id)) };
}

/** A record of a kind with where it is used and, of a carrier, the pair and the pieces that the address asks for. */
export async function getKindPage(
  scope: ActorScope,
  slug: KindSlug,
  id: string | undefined,
  search: URLSearchParams,
): Promise<KindPageData> {
  const found = await getKindRecord(scope, slug, id);
  const [uses, site, trial, units] = await Promise.all([
    whereUsed(scope, KIND_KEYS[slug], found.record.id),
    siteFacts(scope),
    found.slug === "carriers" ? tryPair(scope, found.record, search) : null,
    found.slug === "carriers" ? listCarrierUnits(scope, found.record.id, search) : null,
  ]);
  return { ...found, uses, site, trial, units };
}
