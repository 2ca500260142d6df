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
.ledger .wide, .ledger .stacked p { grid-column: 2 / -1; }
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
.body { display: grid; grid-template: "name name" auto "steps drawn" 1fr / minmax(0, 1fr) 22rem; }
.body.undrawn { display: block; }
.body-name { grid-area: name; margin: 0; padding: .7rem 0 .1rem 1rem; border-left: 1.5px solid var(--accent); margin-left: var(--left); }
.steps { grid-area: steps; display: flex; flex-direction: column; }
.steps::after { content: ""; flex: 1; margin-left: var(--left); border-left: 1.5px solid var(--accent); }
.drawn { grid-area: drawn; padding-left: .6rem; }
.body:not(.undrawn) .steps .line { grid-template-columns: var(--left) minmax(0, 1fr); }
.body:not(.undrawn) .steps .margin { grid-column: 2; border-left: 1.5px solid var(--accent); padding: 0 0 .3rem 1rem; }
.body:not(.undrawn) .steps .margin p, .drawn .margin p { display: inline; margin-right: .8rem; }
.steps .matter { padding-bottom: 0; }
.drawn .line { grid-template-columns: 1.9rem minmax(0, 1fr); } .drawn .number { padding: 0 .4rem 0 0; }
.drawn .matter, .drawn .line.figure .margin { border-left: 0; padding: 0; }
.closures .heading { margin-left: var(--left); padding: .7rem 0 .1rem 1rem; border-left: 1.5px solid var(--accent); color: var(--quiet); }
.closure .matter { padding-top: .1rem; padding-bottom: .1rem; font-size: .94rem; } .closure .number { padding-top: .1rem; } .closure .margin { padding-top: .15rem; padding-bottom: 0; }
.closure .sum, .closure .own { display: inline; } .closure .own { font-size: .84rem; color: var(--quiet); margin-left: .6rem; }
.value { font-size: 1.04rem; }
.given .matter, .result .matter { display: grid; grid-template-columns: minmax(9rem, 2fr) minmax(0, 3fr); gap: 0 1rem; align-items: baseline; align-content: start; }
.band { font-size: .88rem; line-height: 1.38; } .tried { color: var(--quiet); font-size: .82rem; } .ledger + .tried { margin-top: .35rem; } .result .band { grid-column: 1 / -1; } .ledger .band { grid-column: 2 / -1; } td .band { font-size: .8rem; color: var(--quiet); } table + .band, .scroll + .band { color: var(--quiet); font-size: .82rem; margin-top: .25rem; }
.given .source { grid-column: 2; } .given .outside, .given .stale, .result .stale { grid-column: 1 / -1; }
.num { color: var(--ink); border-bottom: 1.5px solid var(--accent); padding: 0 .08em; }
.formula .num { display: inline-block; position: relative; }
.value .num, .closure .num { white-space: nowrap; }
.num:hover { background: var(--wash); text-decoration: none; }
.formula { display: grid; grid-template-columns: max-content minmax(0, 1fr); gap: .06rem .35rem; align-items: center; overflow-x: auto; padding: .05rem 0; }
.formula.plain { grid-template-columns: minmax(0, 1fr); }
.spoken { position: absolute; width: 1px; height: 1px; overflow: hidden; clip-path: inset(50%); white-space: nowrap; }
.why .what, .ledger p { overflow-x: auto; overflow-y: hidden; }
.formula > span { min-width: 0; padding: .05rem 0; } .formula math, .sum math, .ledger math { display: inline math; }
.holds { font-weight: 600; } .fails { font-weight: 700; background: var(--ink); color: var(--paper); padding: .05rem .4rem; }
.stale { font-weight: 700; border: 2px dashed var(--ink); padding: .2rem .5rem; margin-bottom: .3rem; } .margin .stale { border: 0; padding: 0; }
.outdated > .matter { border-left-style: dashed; }
.outside { font-weight: 600; border-left: 4px solid var(--ink); padding-left: .5rem; margin: .2rem 0; }
.query > .matter { border-left-width: 5px; } .conclusion > .matter { font-weight: 600; }
.working { margin: .2rem 0; } .working li { padding-left: 1rem; }
figure { margin: .3rem 0 .2rem; }
.figure-svg { display: block; max-width: 100%; height: auto; }
figcaption { font-size: .85rem; margin-top: .2rem; }
.scroll { overflow-x: auto; background: linear-gradient(90deg, var(--paper) 40%, #fff0) 0 0 / 2rem 100% no-repeat local, linear-gradient(270deg, var(--paper) 40%, #fff0) 100% 0 / 2rem 100% no-repeat local, linear-gradient(90deg, #57534b66, #57534b00) 0 0 / .7rem 100% no-repeat scroll, linear-gradient(270deg, #57534b66, #57534b00) 100% 0 / .7rem 100% no-repeat scroll; }
table { border-collapse: collapse; width: 100%; font-size: .95rem; border-top: 2px solid var(--ink); border-bottom: 2px solid var(--ink); }
caption { text-align: left; font-size: .85rem; padding-bottom: .3rem; }
th, td { padding: .28rem .6rem; text-align: left; border-top: 1px solid var(--rule); vertical-align: baseline; } th { font-size: .82rem; font-weight: 600; } thead th { border-top: 0; }
.figures { white-space: nowrap; }

.on-paper { display: none; margin-left: var(--left); }
.why { margin-left: var(--left); columns: 2; column-gap: 2rem; font-size: .86rem; line-height: 1.38; }
.why li { position: relative; break-inside: avoid; padding: .3rem 0 .3rem 2rem; border-top: 1px solid var(--rule); }
.why .no { position: absolute; left: 0; top: .3rem; min-width: 1.5rem; } .why .what { font-weight: 600; }
.why p:not(.what) { display: inline; } .why p:not(.what)::after { content: "  "; white-space: pre; }
.why li:target, .line:target > .matter { background: var(--wash); }
details { margin-left: var(--left); } details > .why { margin-left: 0; } summary { cursor: pointer; padding: .3rem 0; } details pre { border: 1px solid var(--rule); padding: .7rem; margin-top: .5rem; }
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
  .given .matter, .result .matter { display: block; }
  .scroll td, .scroll th { min-width: 4.4rem; } .scroll .words { min-width: 13rem; }
  .title-block > div { grid-column: span 3; } .title-block > div:nth-child(3), .title-block > div:nth-child(7) { grid-column: 1 / -1; }
  .ledger li { grid-template-columns: 1.6rem minmax(0, 1fr); } .ledger li > p { grid-column: 2; }
  .why { columns: 1; margin-left: .3rem; }
  .body { display: block; } .drawn { padding: 0; } .drawn .line.figure { padding-left: .3rem; }
  .closures .heading, .body-name { padding-left: .7rem; } .body:not(.undrawn) .steps .margin { padding-left: .7rem; }
  figure .scroll .figure-svg { max-width: none; width: 40rem; }
  .line.figure { grid-template-columns: minmax(0, 1fr); } .line.figure > .number { text-align: left; padding-left: .5rem; } .line.figure > .matter, .line.figure > .margin { grid-column: 1; border-left: 0; padding-left: .4rem; }
  .is-ground > .number::after, .is-user > .number::after { content: ""; }
  #trace { right: 0; left: 0; bottom: 0; width: 100%; max-height: 45vh; border-width: 2px 0 0; }
}
`;

const HINTS = `
@media screen and (max-width: 46rem) {
  .broad::before, figure .scroll::before { content: "moves sideways: more at the right"; display: block; position: sticky; left: 0; width: fit-content; font-size: .75rem; color: var(--quiet); }
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
  .on-paper { display: block; margin-left: 0; }
  a, .num, .ref { color: inherit; text-decoration: none; border: 0; }
  h2 { margin-top: 7mm; }
  h2, h3, h4, h5, h6, .body-name, caption, .line.text:has(> .matter > .prose > :is(h3, h4, h5, h6):last-child) { break-after: avoid; }
  .line, .why li, .ledger li, .title-block, .stopped, tr, .status, .colophon { break-inside: avoid; }
  .line.text, .line.table { break-inside: auto; }
  figure { break-inside: avoid; max-width: 128mm; } .body { grid-template-columns: minmax(0, 1fr) 78mm; } .body, .closures .line { break-inside: avoid; }
  .closures .heading { break-after: avoid; }
  .figure-svg { max-height: 215mm; break-inside: avoid; }
  .line.figure:has(.figure-svg + .figure-svg), figure:has(.figure-svg + .figure-svg) { break-inside: auto; max-width: none; }
  figure:has(.scroll) { max-width: none; }
  .scroll, .formula { overflow: visible; background: none; }
  .fails { outline: 1.5pt solid #1c1b19; background: none; color: inherit; }
  .summary { break-after: page; }
  .colophon { break-before: avoid; margin-top: 5mm; }
  .banner { position: static; border: 2pt solid #1c1b19; background: none; color: inherit; margin-bottom: 5mm; }
  .why { margin-left: 0; column-gap: 7mm; font-size: 8.4pt; } .why li { padding: 1mm 0 1mm 9mm; } .why .no { top: 1mm; min-width: 6mm; }
  .margin { font-size: 8.6pt; } .tag { font-size: 7pt; }
  .stamp { display: block; position: fixed; top: 105mm; left: 0; right: 0; text-align: center; font: 700 58pt sans-serif; color: transparent; -webkit-text-stroke: 1pt #8a867d; transform: rotate(-32deg); opacity: .6; }
  .is-ground > .number::after, .is-user > .number::after { content: none; }
  .is-ground > .matter, .is-user > .matter, .line:target > .matter, .why li:target { background: none; box-shadow: none; }
  .is-here > .matter { outline: 0; } .num.is-here { background: none; color: inherit; }
}
`;

export const RULES: string = SCREEN + NARROW + HINTS + PRINT;
