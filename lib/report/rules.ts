// Style rules that are the same in every package.

const SCREEN = `
:root { color-scheme: only light; --ink: #1c1b19; --quiet: #57534b; --rule: #bdb8ac; --accent: #0b5a6b; --wash: #e7f0f1; --paper: #fff; --desk: #eceae4; --left: 4.2rem; --right: 13.5rem; }
*, *::before, *::after { box-sizing: border-box; }
html { background: var(--desk); -webkit-text-size-adjust: 100%; text-size-adjust: 100%; scroll-padding: 3.5rem 0 2rem; }
body { margin: 0; color: var(--ink); font: 1rem/1.45 "Iowan Old Style", "Palatino Linotype", Palatino, "Book Antiqua", "Liberation Serif", Georgia, serif; font-variant-numeric: lining-nums; }
main { max-width: 64rem; margin: 1.5rem auto; padding: 2rem 2.2rem 3rem 1.6rem; background: var(--paper); box-shadow: 0 0 0 1px var(--rule); overflow-wrap: break-word; }
p, ul, ol, dl, dd, figure, pre, h1, h2, h3, h4, h5, h6 { margin: 0; }
ul, ol { padding: 0; list-style: none; }
pre { font: .82rem/1.45 ui-monospace, "Liberation Mono", Consolas, monospace; white-space: pre-wrap; overflow-wrap: anywhere; }
math { font-family: "STIX Two Math", "Cambria Math", "Latin Modern Math", "Libertinus Math", math, serif; font-size: 1.06em; }
a { color: var(--accent); text-decoration: none; }
a:hover { text-decoration: underline; } .ref { border-bottom: 1px dotted var(--accent); }
:focus-visible { outline: 2px solid var(--accent); outline-offset: 2px; }
.skip { position: absolute; left: -200vw; }
.skip:focus { left: 1rem; top: 1rem; z-index: 9; background: var(--paper); padding: .5rem .8rem; }
.none, .source, .says, .caption, .roots { color: var(--quiet); }
.tag, .no, dt, .contents, .kind, .status, figcaption, caption, .banner, th { font-family: "Helvetica Neue", Arial, "Liberation Sans", sans-serif; }
.tag { font-size: .72rem; color: var(--quiet); }

h1 { font-size: 1.9rem; line-height: 1.15; font-weight: 600; text-wrap: balance; }
h2 { font-size: 1.25rem; font-weight: 600; border-bottom: 2px solid var(--ink); padding-bottom: .2rem; margin: 2.4rem 0 .9rem var(--left); }
h3 { font-size: 1.02rem; font-weight: 600; margin: 1.1rem 0 .4rem; }
.prose h3, .prose h4, .prose h5, .prose h6 { margin: .6rem 0 .3rem; font-size: 1.08rem; }
.prose h4, .prose h5, .prose h6 { font-size: 1rem; }
.prose > * + * { margin-top: .5rem; }
.prose ul { list-style: disc; padding-left: 1.2rem; } .prose ol { list-style: decimal; padding-left: 1.4rem; }
.prose table, .prose pre { margin: .5rem 0; } .prose img { max-width: 100%; }

.cover { margin-left: var(--left); }
.kind { font-size: .8rem; color: var(--quiet); margin-bottom: .3rem; }
.status { margin: .9rem 0 1.1rem; padding: .45rem .7rem; border: 2px solid var(--ink); font-weight: 700; letter-spacing: .02em; width: fit-content; }
.title-block { display: grid; grid-template-columns: repeat(6, 1fr); border: 1px solid var(--ink); border-width: 1px 0 0 1px; }
.title-block > div { grid-column: span 2; border: 1px solid var(--ink); border-width: 0 1px 1px 0; padding: .3rem .55rem .4rem; min-height: 3.1rem; }
.title-block > div:nth-child(3) { grid-column: span 2; } .title-block > div:nth-child(4) { grid-column: 1 / -1; min-height: 0; }
dt { font-size: .72rem; color: var(--quiet); }
.blank { display: block; min-height: 1.4rem; }
.stopped { margin: 1.4rem 0 0 var(--left); border: 4px double var(--ink); padding: .8rem 1rem; }
.stopped h2 { margin: 0 0 .5rem; border: 0; font-size: 1.5rem; letter-spacing: .04em; padding: 0; }
.stopped pre { margin: .6rem 0; padding: .5rem .7rem; border-left: 3px solid var(--ink); background: #f5f3ee; }
.message { font-weight: 600; margin-top: .4rem; white-space: pre-wrap; }
.summary > :not(h2) { margin-left: var(--left); }
.plain li { padding-left: 1rem; text-indent: -1rem; margin-bottom: .25rem; } .plain li::before { content: "– "; display: inline-block; width: 1rem; text-indent: 0; }
.ledger li { display: grid; grid-template-columns: 2.2rem minmax(0, 3fr) minmax(0, 2fr); gap: 0 .6rem; align-items: baseline; padding: .28rem 0; border-top: 1px solid var(--rule); }
.ledger .wide { grid-column: 2 / -1; }
.contents { display: flex; flex-wrap: wrap; gap: .3rem 1.2rem; margin: 1.8rem 0 0 var(--left); padding: .55rem 0; border: 1px solid var(--rule); border-width: 1px 0; font-size: .85rem; }
.contents a { padding: .2rem 0; }

.line { display: grid; grid-template-columns: var(--left) minmax(0, 1fr) var(--right); }
.line.text { grid-template-columns: var(--left) minmax(0, 1fr); }
.line.figure, .line.table { grid-template-columns: var(--left) minmax(0, 1fr); }
.number { text-align: right; padding: .35rem .8rem 0 0; }
.no { font-size: .78rem; color: var(--ink); display: inline-block; min-width: 1.6rem; text-align: right; padding: .1rem 0; }
.matter { border-left: 1.5px solid var(--accent); padding: .35rem 1rem .35rem 1rem; }
.margin { font-size: .86rem; line-height: 1.4; padding: .42rem 0 .3rem .4rem; color: var(--quiet); }
.line.figure .margin, .line.table .margin { grid-column: 2; border-left: 1.5px solid var(--accent); padding: 0 1rem .5rem; } .line.text .margin:empty { display: none; }
.line.figure .margin p, .line.table .margin p { display: inline; margin-right: 1rem; }
.body-name { margin: 0; padding: .9rem 0 .1rem 1rem; border-left: 1.5px solid var(--accent); margin-left: var(--left); }
.value { font-size: 1.04rem; }
.given .matter { display: grid; grid-template-columns: minmax(9rem, 2fr) minmax(0, 3fr); gap: 0 1rem; align-items: baseline; align-content: start; }
.given .source { grid-column: 2; } .given .outside, .given .stale { grid-column: 1 / -1; }
.num { color: var(--ink); border-bottom: 1.5px solid var(--accent); padding: 0 .08em; }
.formula .num { display: inline-block; position: relative; }
.num:hover { background: var(--wash); text-decoration: none; }
.formula { display: grid; grid-template-columns: max-content minmax(0, 1fr); gap: .28rem .35rem; align-items: center; overflow-x: auto; padding: .1rem 0; }
.formula.plain { grid-template-columns: minmax(0, 1fr); }
.spoken { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); white-space: nowrap; }
.why .what, .ledger p { overflow-x: auto; overflow-y: hidden; }
.formula > span { min-width: 0; padding: .12rem 0; } .formula math { display: inline math; }
.holds { font-weight: 600; } .fails { font-weight: 700; background: var(--ink); color: var(--paper); padding: .05rem .4rem; }
.stale { font-weight: 700; border: 2px dashed var(--ink); padding: .2rem .5rem; margin-bottom: .3rem; } .margin .stale { border: 0; padding: 0; }
.outdated > .matter { border-left-style: dashed; }
.outside { font-weight: 600; border-left: 4px solid var(--ink); padding-left: .5rem; margin: .2rem 0; }
.query > .matter { border-left-width: 5px; } .conclusion > .matter { font-weight: 600; }
.working { margin: .2rem 0; } .working li { padding-left: 1rem; }
figure { max-width: 33rem; margin: .3rem auto .2rem; } figure.free-body { max-width: 28rem; }
.figure-svg { display: block; width: 100%; height: auto; }
figcaption { font-size: .85rem; margin-top: .3rem; }
.scroll { overflow-x: auto; }
table { border-collapse: collapse; width: 100%; font-size: .95rem; border-top: 2px solid var(--ink); border-bottom: 2px solid var(--ink); }
caption { text-align: left; font-size: .85rem; padding-bottom: .3rem; }
th, td { padding: .28rem .6rem; text-align: left; border-top: 1px solid var(--rule); vertical-align: baseline; } th { font-size: .82rem; font-weight: 600; } thead th { border-top: 0; }
.figures { white-space: nowrap; }

.why li { display: grid; grid-template-columns: var(--left) minmax(0, 5fr) minmax(0, 7fr); gap: 0 1rem; padding: .4rem 0; border-top: 1px solid var(--rule); }
.why .no { grid-row: 1 / span 4; } .why .what { grid-row: 1 / span 4; grid-column: 2; font-weight: 600; }
.why .on, .why .by, .why .roots { grid-column: 3; }
.why li:target, .line:target > .matter { background: var(--wash); }
details { margin-left: var(--left); } summary { cursor: pointer; padding: .3rem 0; } details pre { border: 1px solid var(--rule); padding: .7rem; margin-top: .5rem; }
.colophon { margin: 2.5rem 0 0 var(--left); padding-top: .6rem; border-top: 1px solid var(--rule); font-size: .82rem; color: var(--quiet); overflow-wrap: anywhere; }

.banner { position: sticky; top: 0; z-index: 4; padding: .55rem 1rem; background: var(--ink); color: #fff; font-weight: 700; text-align: center; letter-spacing: .03em; }
.stamp { display: none; }
.is-ground > .matter { background: var(--wash); box-shadow: inset 6px 0 var(--accent); } .is-ground > .number::after { content: "stands on"; display: block; font: 600 .68rem "Helvetica Neue", Arial, sans-serif; color: var(--accent); }
.is-user > .matter { background: #f3f1ea; box-shadow: inset 6px 0 var(--ink); } .is-user > .number::after { content: "uses it"; display: block; font: 600 .68rem "Helvetica Neue", Arial, sans-serif; }
.is-here > .matter { outline: 2px solid var(--accent); outline-offset: -2px; } .num.is-here { background: var(--accent); color: #fff; }
#trace { position: fixed; right: 1rem; bottom: 1rem; z-index: 5; width: min(24rem, calc(100vw - 2rem)); max-height: 55vh; overflow: auto; background: var(--paper); border: 2px solid var(--accent); padding: .8rem 1rem; box-shadow: 0 .4rem 1.4rem #0004; }
#trace[hidden] { display: none; }
#trace button { float: right; font: inherit; font-size: .85rem; color: var(--accent); background: none; border: 1px solid var(--accent); padding: .3rem .7rem; min-height: 2.2rem; cursor: pointer; }
#trace .what { font-weight: 600; margin-bottom: .35rem; } #trace p + p { margin-top: .3rem; } #trace .no::before { content: "line "; }
#trace .no { color: var(--accent); text-align: left; }
`;

const NARROW = `
@media (max-width: 46rem) {
  :root { --left: 2.1rem; --right: 0; }
  body { font-size: .98rem; }
  main { margin: 0; padding: 1.1rem .8rem 3rem .3rem; box-shadow: none; }
  h1 { font-size: 1.5rem; } h2 { margin-left: var(--left); }
  .line, .line.text { grid-template-columns: var(--left) minmax(0, 1fr); }
  .number { padding-right: .45rem; } .no { min-width: 1.2rem; }
  .matter { padding: .35rem 0 .3rem .7rem; }
  .margin, .line.figure .margin, .line.table .margin { grid-column: 2; border-left: 1.5px solid var(--accent); padding: 0 0 .45rem .7rem; }
  .margin p { display: inline; margin-right: .8rem; }
  .given .matter { display: block; }
  .title-block > div { grid-column: span 3; } .title-block > div:nth-child(3), .title-block > div:nth-child(7) { grid-column: 1 / -1; }
  .ledger li { grid-template-columns: 1.6rem minmax(0, 1fr); } .ledger li > p { grid-column: 2; }
  .why li { grid-template-columns: var(--left) minmax(0, 1fr); } .why .what, .why .on, .why .by, .why .roots { grid-column: 2; grid-row: auto; }
  .why .no { grid-row: 1; }
  .line.figure { grid-template-columns: minmax(0, 1fr); } .line.figure > .number { text-align: left; padding-left: .5rem; } .line.figure > .matter, .line.figure > .margin { grid-column: 1; border-left: 0; padding-left: .4rem; }
  .is-ground > .number::after, .is-user > .number::after { content: ""; }
  #trace { right: 0; left: 0; bottom: 0; width: 100%; max-height: 45vh; border-width: 2px 0 0; }
}
`;

const PRINT = `
@media print {
  :root { --left: 11mm; --right: 36mm; --desk: #fff; }
  html { background: none; }
  body { font-size: 10.3pt; line-height: 1.36; }
  main { max-width: none; margin: 0; padding: 0; box-shadow: none; }
  .contents, .skip, #trace, details { display: none; }
  h2[id="notebook"] { display: none; }
  a, .num, .ref { color: inherit; text-decoration: none; border: 0; }
  h2 { margin-top: 7mm; }
  h2, h3, .body-name, caption { break-after: avoid; }
  .line, .why li, .ledger li, .title-block, .stopped, tr, .status, .colophon { break-inside: avoid; }
  .line.text, .line.table { break-inside: auto; }
  figure { break-inside: avoid; max-width: 120mm; } figure.free-body { max-width: 100mm; }
  .figure-svg { max-height: 215mm; }
  .scroll, .formula { overflow: visible; }
  .fails { outline: 1.5pt solid #1c1b19; background: none; color: inherit; }
  .summary { break-after: page; }
  .colophon { break-before: avoid; margin-top: 5mm; }
  .banner { position: static; border: 2pt solid #1c1b19; background: none; color: inherit; margin-bottom: 5mm; }
  .why { columns: 2; column-gap: 7mm; font-size: 8.4pt; }
  .why li { display: block; position: relative; padding: 1.2mm 0 1.2mm 9mm; } .why .no { position: absolute; left: 0; top: 1.2mm; min-width: 6mm; }
  .margin { font-size: 8.6pt; } .tag { font-size: 7pt; }
  .stamp { display: block; position: fixed; top: 105mm; left: 0; right: 0; text-align: center; font: 700 58pt sans-serif; color: transparent; -webkit-text-stroke: 1pt #8a867d; transform: rotate(-32deg); opacity: .6; }
  .is-ground > .number::after, .is-user > .number::after { content: none; }
  .is-ground > .matter, .is-user > .matter, .line:target > .matter, .why li:target { background: none; box-shadow: none; }
  .is-here > .matter { outline: 0; } .num.is-here { background: none; color: inherit; }
}
`;

export const RULES: string = SCREEN + NARROW + PRINT;
