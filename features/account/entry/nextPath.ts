const here = "https://here.invalid";

/** Where to go after signing in: only a path of this site, whatever stands in the address; else the first page. */
export function nextPath(wanted: string | string[] | undefined): string {
  // A backslash or a control character is read by browsers in ways that lead elsewhere.
  if (typeof wanted !== "string" || !wanted.startsWith("/") || /[\\\u0000-\u001f\u007f]/.test(wanted)) return "/";
  let url: URL;
  try {
    url = new URL(wanted, here);
  } catch {
    return "/";
  }
  if (url.origin !== here || url.pathname.startsWith("//") || /^\/account\/sign-(in|up)\/?$/.test(url.pathname))
    return "/";
  return url.pathname + url.search + url.hash;
}
