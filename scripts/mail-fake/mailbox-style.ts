export const mailboxStyle = `
:root{color-scheme:light dark;--paper:#f5f2ea;--sheet:#fffdf8;--wash:#ece6d8;--ink:#1b1813;--soft:#6b6355;--line:#d9d2c2;--spike:#b3321c;--reed:#1d6f5c;--brass:#8f5c00}
@media (prefers-color-scheme:dark){:root{--paper:#15130f;--sheet:#1e1b16;--wash:#2a261f;--ink:#f1ebde;--soft:#a89f8d;--line:#3a352b;--spike:#ff7a5c;--reed:#5cc9a7;--brass:#e6b04a}}
*{box-sizing:border-box}
body{margin:0;background:var(--paper);color:var(--ink);font:16px/1.5 system-ui,sans-serif;overflow-wrap:anywhere}
main{max-width:60rem;margin:0 auto;padding:24px 16px 64px}
h1{font-size:1.6rem;line-height:1.2;margin:0 0 8px}
h2{font-size:1.05rem;margin:32px 0 8px}
p{margin:0 0 8px}
a{color:inherit;text-decoration-color:var(--spike);text-underline-offset:3px}
:focus-visible{outline:3px solid var(--spike);outline-offset:2px}
.soft{color:var(--soft)}
.mails{list-style:none;margin:24px 0 0;padding:0;border-top:1px solid var(--line)}
.mails a{display:block;padding:12px;border-bottom:1px solid var(--line);border-left:4px solid var(--brass);text-decoration:none;min-height:44px}
.mails a:hover{background:var(--wash)}
.mails .delivered{border-left-color:var(--reed)}
.mails .bounced,.mails .complained{border-left-color:var(--spike)}
.mails strong{display:block}
.mails span{display:block;color:var(--soft);font-size:.9rem}
dl{display:grid;grid-template-columns:max-content 1fr;gap:4px 16px;margin:16px 0}
dt{color:var(--soft)}
dd{margin:0}
iframe{display:block;width:100%;height:70vh;border:1px solid var(--line);background:#fff}
pre{background:var(--sheet);border:1px solid var(--line);padding:12px;margin:0;white-space:pre-wrap;overflow-x:auto}
ul.plain{margin:0;padding:0;list-style:none}
ul.plain a{display:inline-block;padding:10px 0;min-height:44px}
form.fates{display:flex;flex-wrap:wrap;gap:8px}
button{font:inherit;color:var(--ink);background:var(--sheet);border:1px solid var(--soft);padding:10px 14px;min-height:44px;cursor:pointer}
button:hover{background:var(--wash)}
[hidden]{display:none}
`
