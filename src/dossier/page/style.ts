/** The page's whole look: plain, dark where the reader's screen is, A4 in print. `foot` is a plain text of ours. */
export function style(foot: string): string {
  return `
:root { --paper: #ffffff; --ink: #1b2228; --muted: #55606a; --rule: #c9d0d6; --soft: #f1f4f6; --link: #0b5394;
  --observed: #8a97a3; --simulated: #0b4f8a; --band: #c3d9ec; --first: #0b4f8a; --second: #a34700; --bad: #a3231f;
  --good: #1d6b3a; --shade0: #dfe6ec; --shade1: #b9cadb; --shade2: #8fb0cc; --shade3: #e9dcc3; --warn-paper: #fff6e0; }
@media screen and (prefers-color-scheme: dark) {
  :root { --paper: #14191d; --ink: #e6eaed; --muted: #a9b4bd; --rule: #3b464f; --soft: #1e252b; --link: #8cc4ff;
    --observed: #7b8894; --simulated: #8cc4ff; --band: #23435e; --first: #8cc4ff; --second: #ffb37a; --bad: #ff9b94;
    --good: #8fdba9; --shade0: #35424d; --shade1: #2c4a66; --shade2: #3d6489; --shade3: #57482c; --warn-paper: #33290f; } }
* { box-sizing: border-box; }
html { background: var(--paper); color: var(--ink); font: 16px/1.5 system-ui, "Liberation Sans", Arial, sans-serif; }
body { margin: 0 auto; max-width: 62rem; padding: 1rem; overflow-wrap: anywhere; }
h1 { font-size: 1.7rem; line-height: 1.2; margin: .5rem 0 .75rem; }
h2 { font-size: 1.3rem; margin: 2.2rem 0 .6rem; padding-top: .6rem; border-top: 2px solid var(--ink); }
h3 { font-size: 1.08rem; margin: 1.5rem 0 .4rem; }
h4 { font-size: 1rem; margin: 1.1rem 0 .3rem; }
p { margin: .5rem 0; max-width: 46rem; }
a { color: var(--link); }
time { white-space: nowrap; }
code { font-family: ui-monospace, "Liberation Mono", monospace; font-size: .88em; }
pre { background: var(--soft); padding: .6rem .8rem; white-space: pre-wrap; margin: .5rem 0; }
p.caution, p.draft, p.good, p.bad { max-width: none; padding: .6rem .8rem; border: 1px solid var(--rule); border-left-width: 6px; }
p.caution { background: var(--warn-paper); border-color: var(--second); }
p.draft { border-color: var(--bad); font-weight: 600; }
p.good { border-color: var(--good); }
p.bad { border-color: var(--bad); }
nav ul { display: flex; flex-wrap: wrap; gap: .2rem 1.1rem; list-style: none; margin: 1rem 0 0; padding: .6rem 0 0; border-top: 1px solid var(--rule); }
dl { margin: .6rem 0; }
dl div { display: grid; grid-template-columns: 11rem 1fr; gap: 0 1rem; padding: .15rem 0; }
dt { color: var(--muted); }
dd { margin: 0; }
table { border-collapse: collapse; width: 100%; margin: .8rem 0 1.2rem; font-size: .9rem; }
caption { text-align: left; font-weight: 600; padding: .2rem 0; }
th, td { text-align: left; vertical-align: top; padding: .25rem .6rem .25rem 0; border-bottom: 1px solid var(--rule); font-weight: normal; overflow-wrap: break-word; }
thead th { color: var(--muted); border-bottom: 1px solid var(--ink); }
tbody th { font-weight: 600; }
.figures { display: grid; grid-template-columns: repeat(auto-fit, minmax(min(100%, 25rem), 1fr)); gap: 1.2rem 1.6rem; margin: 1rem 0; }
figure { margin: 0; max-width: 34rem; min-width: 0; }
figcaption { font-weight: 600; margin-bottom: .3rem; }
p.summary, p.source { font-size: .85rem; margin: .2rem 0; }
p.source { color: var(--muted); }
svg.chart { display: block; width: 100%; height: auto; }
svg.strip { width: 7.5rem; height: 1rem; vertical-align: middle; }
.strip-text { display: block; font-size: .8rem; color: var(--muted); }
svg text { font: 11.5px system-ui, "Liberation Sans", Arial, sans-serif; fill: var(--ink); }
svg .tick { fill: var(--muted); font-size: 11px; }
svg .axis-name { font-size: 11px; }
svg path { fill: none; stroke-linejoin: round; }
svg .axis { stroke: var(--ink); stroke-width: 1; }
svg .grid { stroke: var(--rule); stroke-width: .6; }
svg .observed { stroke: var(--observed); stroke-width: 2.2; stroke-linecap: round; }
svg .simulated { stroke: var(--simulated); stroke-width: .8; stroke-linecap: round; }
svg .dashed { stroke-width: 1.6; stroke-dasharray: 6 3; }
svg .band { fill: var(--band); }
svg .reference { stroke: var(--ink); stroke-width: 1; stroke-dasharray: 3 3; }
svg .reference.solid { stroke-dasharray: none; stroke-width: 2; }
svg .dots { stroke: var(--first); stroke-width: 3; stroke-linecap: round; }
svg .dots.medium { stroke-width: 4.5; }
svg .dots.big { stroke-width: 6; }
svg .dots.first { stroke: var(--first); }
svg .crosses { stroke: var(--second); stroke-width: 1.1; }
svg .lozenge { fill: var(--second); stroke: var(--ink); stroke-width: .8; }
svg .lozenge.outside { fill: var(--paper); stroke: var(--bad); stroke-width: 2; }
svg .bar { fill: var(--simulated); }
svg .bar.pale { fill: var(--observed); }
svg .bar.hollow { fill: var(--paper); stroke: var(--ink); stroke-width: 1.2; stroke-dasharray: 3 2; }
svg .bar.second { fill: var(--shade3); stroke: var(--ink); stroke-width: 1; }
svg .gap { fill: var(--bad); }
svg .part { stroke: var(--ink); stroke-width: .7; }
svg .shade0 { fill: var(--shade0); } svg .shade1 { fill: var(--shade1); } svg .shade2 { fill: var(--shade2); } svg .shade3 { fill: var(--shade3); }
svg .node { fill: var(--good); }
svg .node.unsound { fill: var(--bad); }
svg .key.unsound { fill: var(--bad); font-weight: 700; }
svg .arc { stroke: var(--simulated); stroke-width: 1; }
svg .arc.stale { stroke: var(--bad); stroke-width: 2; stroke-dasharray: 5 3; }
svg .tip { fill: var(--ink); }
.draft-mark { display: none; }
@media (max-width: 40rem) {
  body { padding: .75rem; }
  dl div { display: block; }
  dt, dd { display: inline; }
  dt::after { content: ": "; }
  table, tbody, tr, td, th, caption { display: block; }
  thead { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); }
  tr { padding: .4rem 0; border-bottom: 1px solid var(--ink); }
  td, tbody th { border: 0; padding: .1rem 0; }
  td[data-label]::before { content: attr(data-label) ": "; color: var(--muted); }
}
@page { size: A4; margin: 16mm 15mm 18mm;
  @bottom-left { content: "${foot}"; font: 8pt sans-serif; color: #555; }
  @bottom-right { content: counter(page) " / " counter(pages); font: 8pt sans-serif; color: #555; } }
@media print {
  html { font-size: 10pt; }
  body { max-width: none; padding: 0; }
  nav { display: none; }
  h2, h3, h4, caption, figcaption { break-after: avoid; }
  figure, tr, dl div, p, li { break-inside: avoid; }
  thead { display: table-header-group; }
  thead, thead tr { break-after: avoid; }
  tbody tr:first-child { break-before: avoid; }
  figure:only-child { grid-column: 1 / -1; max-width: 125mm; }
  table, tbody { display: revert; }
  .figures { grid-template-columns: 1fr 1fr; gap: 5mm 7mm; }
  .draft-mark { display: block; position: fixed; left: 0; right: 0; top: 40%; text-align: center; font-size: 90pt;
    font-weight: 700; letter-spacing: .1em; color: rgb(163 35 31 / 14%); transform: rotate(-35deg); }
}
`;
}
