/*
 * Answers a page that the server cannot be asked for with one that says so. Keeps nothing else: what is confidential never stays on a
 * device by its doing, and every page that can be fetched is fetched.
 */
const KEPT = "unreachable-1";
const PAGE = "/unreachable.html";

self.addEventListener("install", (event) => {
  event.waitUntil(caches.open(KEPT).then((cache) => cache.add(new Request(PAGE, { cache: "reload" }))));
  self.skipWaiting();
});

self.addEventListener("activate", (event) => {
  const others = caches.keys().then((names) => names.filter((name) => name.startsWith("unreachable-") && name !== KEPT));
  event.waitUntil(others.then((names) => Promise.all(names.map((name) => caches.delete(name)))));
});

self.addEventListener("fetch", (event) => {
  const { mode, method } = event.request;
  if (mode !== "navigate" || method !== "GET") return;
  event.respondWith(fetch(event.request).catch(() => caches.match(PAGE).then((page) => page ?? Response.error())));
});
