// Everything of the outbox in one chunk, which comes after the page works.
export { flushOutbox } from "./flush-outbox.ts";
export { keepPage, keptPage } from "./kept-page.ts";
export { deedsOf, dropDeed, keepDeed } from "./outbox.ts";
export { onOutboxChange } from "./outbox-news.ts";
