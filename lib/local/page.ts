import type { ServerResponse } from "node:http";

/** Makes text safe inside HTML and inside a quoted attribute. */
export const escape = (text: string) =>
  text.replace(/[&<>"']/g, (sign) => ({ "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;", "'": "&#39;" })[sign] ?? sign);

const STYLE = `
:root{color-scheme:light dark;--card:#f4f1e8;--sheet:#fdfcf8;--rule:#c9c3b3;--strong:#7d7765;--ink:#1c232b;--ink2:#4a545e;--link:#234e7d;--note:#f7ebcd;--bad:#a3331b;--good:#0f6b58}
@media (prefers-color-scheme:dark){:root{--card:#14181c;--sheet:#1c2228;--rule:#3b444c;--strong:#77828c;--ink:#ece8dd;--ink2:#b3bac0;--link:#9cc3f0;--note:#3a2f14;--bad:#f0a18d;--good:#7fd1bb}}
@media (prefers-contrast:more){:root{--ink2:var(--ink);--rule:var(--strong)}}
*{box-sizing:border-box}
body{margin:0;background:var(--card);color:var(--ink);font:15px/1.45 system-ui,sans-serif;overflow-wrap:anywhere}
.note{background:var(--note);border-bottom:1px solid var(--rule);padding:10px 16px;font-size:14px}
main{max-width:820px;margin:0 auto;padding:16px}
main.narrow{max-width:460px}
h1{font-size:21px;line-height:1.25;margin:12px 0}
a{color:var(--link)}
.sheet{background:var(--sheet);border:1px solid var(--rule);margin:12px 0}
.sheet>*{padding:10px 14px;margin:0}
.sheet>*+*{border-top:1px solid var(--rule)}
.row{display:block;color:inherit;text-decoration:none}
.row:hover,.row:focus-visible{outline:2px solid var(--link);outline-offset:-2px}
.row strong{display:block}
small,.hint{color:var(--ink2);font-size:14px}
.hint{margin:8px 0}
h2.hint{margin:0}
dl{display:grid;grid-template-columns:max-content 1fr;gap:4px 14px}
dt{color:var(--ink2)}
dd{margin:0}
pre{white-space:pre-wrap;font:inherit}
iframe{display:block;width:100%;height:70vh;padding:0;border:0;background:#fff}
form.line{display:flex;gap:8px;align-items:end;flex-wrap:wrap}
label{display:block;font-size:14px;color:var(--ink2);flex:1 1 200px}
input,button,.button{font:inherit;min-height:44px;padding:8px 14px;border:1px solid var(--strong);background:var(--sheet);color:var(--ink)}
input{display:block;width:100%;margin-top:4px}
button,.button{cursor:pointer;display:inline-flex;align-items:center;justify-content:center;text-decoration:none;font-weight:600}
.main{background:var(--link);color:var(--card);border-color:var(--link)}
.stack{display:grid;gap:10px}
.amount{font-size:28px;font-variant-numeric:tabular-nums}
.end{margin-left:auto;font-variant-numeric:tabular-nums}
.items{display:flex;gap:12px;align-items:baseline}
.money{white-space:nowrap}
.bad{color:var(--bad);font-weight:600}
.good{color:var(--good);font-weight:600}
:focus-visible{outline:2px solid var(--link);outline-offset:2px}
`;

/** Sends a page that says above everything else what kind of stand-in it comes from. */
export function sendPage(
  response: ServerResponse,
  page: { status?: number; title: string; note: string; body: string; narrow?: boolean; formTargets?: readonly string[] },
): void {
  // Browsers hold form-action against the redirect that follows a form, so where it may lead is named too.
  const targets = ["'self'", ...(page.formTargets ?? [])].join(" ");
  response.writeHead(page.status ?? 200, {
    "content-type": "text/html; charset=utf-8",
    "cache-control": "no-store",
    "referrer-policy": "no-referrer",
    "x-content-type-options": "nosniff",
    "content-security-policy": `default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-src 'self'; form-action ${targets}; frame-ancestors 'none'`,
  });
  response.end(`<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1">
<title>${escape(page.title)}</title><link rel="icon" href="data:,"><style>${STYLE}</style></head>
<body><div class="note" role="note">${escape(page.note)}</div><main${page.narrow ? ' class="narrow"' : ""}>
${page.body}
</main></body></html>`);
}
