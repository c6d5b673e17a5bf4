// Sets the kept scheme before the first paint, so that the page never flashes in the other one.
try {
  const kept = localStorage.getItem("larkspan-scheme");
  if (kept === "morning" || kept === "lamplight") document.documentElement.dataset.scheme = kept;
} catch {
  // Storage may be shut off: the page then follows the system.
}
