/*
 * Keeps the pages of the floor that were opened last, so that they can be read through a lost connection. Every page that can be
 * fetched is fetched; what is kept says when it was fetched, belongs to one person, and goes after twelve hours or when somebody else
 * comes. Signing out takes all of it away.
 */
const PAGES = "floor-pages-";
const FIND = "/floor";
const ASSETS = "floor-assets-1";
const KEPT_FOR = 12 * 3600 * 1000;
/** A kept page is better than one that may never come. */
const PATIENCE = 8000;
const MOST_ASSETS = 300;

self.addEventListener("install", () => self.skipWaiting());
self.addEventListener("activate", (event) => event.waitUntil(self.clients.claim()));

self.addEventListener("fetch", (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== "GET" || url.origin !== location.origin) return;
  if (request.mode === "navigate") event.respondWith(page(event));
  else if (url.pathname.startsWith("/assets/")) event.respondWith(asset(request));
});

self.addEventListener("message", (event) => {
  if (Array.isArray(event.data?.keep)) event.waitUntil(keepAll(event.data.keep));
  if (event.data?.forget === true) event.waitUntil(forget());
});

/** Counts how often all was taken away: what was on its way before that is not kept any more. */
let forgotten = 0;

async function forget() {
  forgotten += 1;
  for (const name of await caches.keys()) if (name.startsWith(PAGES)) await caches.delete(name);
}

async function page(event) {
  const since = forgotten;
  const old = await kept(event.request.url);
  try {
    const answer = await (old ? Promise.race([fetch(event.request), tooLate()]) : fetch(event.request));
    event.waitUntil(keep(event.request.url, answer.clone(), since));
    return answer;
  } catch {
    return old ?? (await toFind(event.request.url)) ?? (await caches.match("/unreachable.html")) ?? Response.error();
  }
}

/** Whoever looks for a lot without a connection is led to the lots that were theirs last; null for every other page. */
async function toFind(url) {
  const { pathname, search } = new URL(url);
  if (pathname !== FIND || search === "") return null;
  return (await kept(new URL(FIND, location.origin).href)) && Response.redirect(FIND);
}

const tooLate = () => new Promise((_, reject) => setTimeout(reject, PATIENCE));

/** Files of the product, whose names change with their content. */
async function asset(request) {
  const cache = await caches.open(ASSETS);
  const known = await cache.match(request.url);
  if (known) return known;
  const answer = await fetch(request);
  if (answer.ok) await cache.put(request.url, answer.clone());
  const names = await cache.keys();
  for (const name of names.slice(0, Math.max(0, names.length - MOST_ASSETS))) await cache.delete(name);
  return answer;
}

/** Keeps a page of a lot, with the files that it names, for the person whom it was made for. */
async function keep(url, answer, since = forgotten) {
  if (!answer.ok || answer.redirected) return;
  const text = await answer.text();
  const person = /data-floor-person="([0-9a-f-]{36})"/.exec(text)?.[1];
  if (!person) return;
  for (const name of await caches.keys())
    if (name.startsWith(PAGES) && name !== PAGES + person) await caches.delete(name);
  const headers = new Headers(answer.headers);
  headers.set("Kept-At", new Date().toISOString());
  headers.delete("Content-Encoding");
  headers.delete("Content-Length");
  if (since !== forgotten) return;
  await (await caches.open(PAGES + person)).put(url, new Response(text, { headers }));
  if (since !== forgotten) await caches.delete(PAGES + person);
  const files = [...new Set(text.match(/\/assets\/[\w.-]+\.(?:js|css|woff2)/g) ?? [])];
  await Promise.all(files.map((file) => asset(new Request(new URL(file, location.origin))).catch(() => undefined)));
}

/** What is kept of a page, marked as such; null where there is nothing or it is too old. */
async function kept(url) {
  for (const name of await caches.keys()) {
    if (!name.startsWith(PAGES)) continue;
    const cache = await caches.open(name);
    const found = await cache.match(url);
    const at = found?.headers.get("Kept-At");
    if (!found || !at) continue;
    if (Date.now() - Date.parse(at) > KEPT_FOR) {
      await cache.delete(url);
      continue;
    }
    const text = await found.text();
    return new Response(text.replace("<html ", `<html data-kept-at="${at}" `), { headers: found.headers });
  }
  return null;
}

/** Keeps pages that were not opened yet: the steps of a lot that somebody is about to work on. One after the other, to be no burden. */
async function keepAll(paths) {
  const since = forgotten;
  for (const path of paths) {
    const url = new URL(path, location.origin).href;
    const old = await kept(url);
    const at = old?.headers.get("Kept-At");
    if (at && Date.now() - Date.parse(at) < 60_000) continue;
    try {
      if (since !== forgotten) return;
      await keep(url, await fetch(url, { credentials: "same-origin" }), since);
    } catch {
      return;
    }
  }
}
