/** Heavy parts of the engine, fetched when they are first wanted: the file readers alone weigh more than the page. */
export const lazyReaders = {
  melodyFile: () => import("@/shared/songs/melodyFile"),
  demoSongs: () => import("@/shared/songs/demoSongs"),
};
