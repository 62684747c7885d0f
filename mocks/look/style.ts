/** The shop's own tokens (warm paper, graphite, copper, steel) for the pages of the outside world. */
const LIGHT = 'color-scheme:light;--ground:#f5f2ec;--card:#fff;--text:#23292c;--muted:#566066;--line:#8d877b;--hair:#ddd6c9;--copper:#9c4a17;--on-copper:#fff;--steel:#285a7b;--good:#1f6b45;--bad:#a12c24;--unsure:#7a4f00';
const DARK = 'color-scheme:dark;--ground:#14181a;--card:#1c2224;--text:#ece7de;--muted:#aab4b8;--line:#77838a;--hair:#323c40;--copper:#e39158;--on-copper:#14181a;--steel:#86b7db;--good:#6fc797;--bad:#f28f83;--unsure:#ebb955';

export const STYLE = `
@font-face{font-family:"Noto Sans";font-weight:400;font-display:swap;src:url(/_look/400.woff2) format("woff2")}
@font-face{font-family:"Noto Sans";font-weight:600;font-display:swap;src:url(/_look/600.woff2) format("woff2")}
:root{${LIGHT}}
@media (prefers-color-scheme:dark){:root{${DARK}}}
*{box-sizing:border-box}
body{margin:0;background:var(--ground);color:var(--text);font:16px/1.5 "Noto Sans",system-ui,sans-serif;overflow-wrap:anywhere}
header{display:flex;align-items:center;gap:12px;padding:12px 16px;border-bottom:1px solid var(--hair);background:var(--card)}
header svg{flex:none}
header strong{font-weight:600}
header nav{margin-left:auto;display:flex;gap:16px}
.strip{padding:10px 16px;background:var(--text);color:var(--ground);font-weight:600}
main{max-width:560px;margin:0 auto;padding:20px 16px 48px}
main.wide{max-width:1120px}
h1{font-size:22px;line-height:1.3;margin:0 0 4px}
h2{font-size:16px;margin:28px 0 8px}
p{margin:0 0 12px}
a{color:var(--copper)}
.quiet{color:var(--muted)}
.small{font-size:14px}
.sum{font-size:34px;font-weight:600;line-height:1.2;font-variant-numeric:tabular-nums;margin:0 0 4px}
.card{background:var(--card);border:1px solid var(--hair);border-radius:3px;padding:16px;margin:16px 0}
.note{border-left:6px solid var(--steel);background:var(--card);padding:12px 14px;margin:16px 0}
.note.bad{border-color:var(--bad)}
.note.good{border-color:var(--good)}
.note :last-child{margin-bottom:0}
dl.lines{margin:0}
dl.lines div{display:flex;justify-content:space-between;gap:16px;padding:6px 0;border-bottom:1px solid var(--hair)}
dl.lines div:last-child{border-bottom:0}
dl.lines dd{margin:0;font-variant-numeric:tabular-nums;white-space:nowrap}
label{display:block;font-weight:600;margin:14px 0 4px}
input,select{width:100%;min-height:48px;padding:8px 12px;border:1px solid var(--line);border-radius:3px;background:var(--card);color:var(--text);font:inherit;font-weight:400;font-variant-numeric:tabular-nums}
input[aria-invalid=true]{border:2px solid var(--bad)}
.wrong{color:var(--bad);font-size:14px;margin:4px 0 0}
.hint{margin:4px 0 0;font-size:14px;color:var(--muted)}
.back{text-align:center;margin:14px 0 0}
.pair{display:grid;grid-template-columns:1fr 1fr;gap:16px}
button{font:inherit;font-weight:600;min-height:48px;padding:10px 18px;border-radius:3px;border:1px solid var(--copper);background:var(--copper);color:var(--on-copper);cursor:pointer}
button.plain{background:var(--card);color:var(--copper)}
button.full{width:100%;margin-top:22px}
:focus-visible{outline:3px solid var(--steel);outline-offset:2px}
details{margin:20px 0}
summary{font-weight:600;min-height:44px;padding:10px 0;cursor:pointer}
ul.cards{list-style:none;margin:0;padding:0;display:grid;gap:8px}
ul.cards button{width:100%;display:flex;flex-wrap:wrap;justify-content:space-between;align-content:center;align-items:center;gap:2px 12px;text-align:left;font-weight:400;padding:8px 12px;border-color:var(--line);background:var(--card);color:var(--text)}
ul.cards b{font-weight:600;font-variant-numeric:tabular-nums}
ul.cards span{color:var(--muted)}
fieldset{border:0;margin:0;padding:0}
.scroll{overflow-x:auto}
table{width:100%;border-collapse:collapse;background:var(--card);border:1px solid var(--hair);font-size:14px}
th,td{text-align:left;vertical-align:top;padding:8px 12px;border-bottom:1px solid var(--hair)}
th{font-weight:600;color:var(--muted)}
th,td{overflow-wrap:normal}
td button{white-space:nowrap}
td.n{font-variant-numeric:tabular-nums;white-space:nowrap}
td form{display:inline}
td button{min-height:32px;padding:2px 10px;font-size:14px}
.row{display:flex;flex-wrap:wrap;gap:12px;align-items:end}
.row>*{flex:1 1 170px}
.row>label:has(select){flex-basis:230px}
.row>button{flex:0 0 auto}
.row label{margin:0}
.tools{display:flex;flex-wrap:wrap;gap:8px;margin:12px 0}
iframe{width:100%;height:420px;resize:vertical;border:1px solid var(--hair);background:#fff}
pre{white-space:pre-wrap;background:var(--card);border:1px solid var(--hair);border-radius:3px;padding:14px;margin:0;font:14px/1.5 "Noto Sans Mono",ui-monospace,monospace}
ul.mails{list-style:none;margin:16px 0;padding:0;background:var(--card);border:1px solid var(--hair);border-radius:3px}
ul.mails li{border-bottom:1px solid var(--hair)}
ul.mails li:last-child{border-bottom:0}
ul.mails a{display:grid;grid-template-columns:1fr auto;gap:0 16px;padding:12px 16px;color:inherit;text-decoration:none;min-height:48px}
ul.mails a:hover b{text-decoration:underline}
ul.mails time{color:var(--muted);font-size:14px;white-space:nowrap}
`;
