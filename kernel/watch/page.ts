// The page that shows a package and loads it again when it was written anew. The package itself stays as it is.

/** `title` stands in the window's bar. */
export const viewerPage = (title: string): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${title
  .replaceAll("&", "&amp;")
  .replaceAll("<", "&lt;")}</title>
<style>html,body{margin:0;height:100%}iframe{border:0;width:100%;height:100%;display:block}
#state{position:fixed;right:12px;bottom:12px;padding:4px 10px;font:13px sans-serif;background:#1c2733;color:#fff}
#state:empty{display:none}</style></head>
<body><iframe title="calculation package"></iframe><div id="state" role="status"></div>
<script>
const frame = document.querySelector("iframe");
const state = document.getElementById("state");
const show = (number) => {
  let place = 0;
  try { place = frame.contentWindow.scrollY; } catch {}
  frame.onload = () => { try { frame.contentWindow.scrollTo(0, place); } catch {} };
  frame.src = "/package?" + number;
};
const events = new EventSource("/events");
events.addEventListener("written", (event) => { state.textContent = ""; show(event.data); });
events.addEventListener("running", () => { state.textContent = "running again"; });
events.addEventListener("failed", (event) => { state.textContent = "stopped: see the terminal"; show(event.data); });
events.onerror = () => { state.textContent = "hingebook run --watch has ended"; };
</script></body></html>
`;
