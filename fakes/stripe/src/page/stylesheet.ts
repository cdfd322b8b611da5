/** Plain on purpose, and like nobody's: nobody should take this page for a real one. */
export const stylesheet = `
:root {
  color-scheme: light dark;
  --ground: #f2f3f4; --sheet: #fff; --ink: #1c232b; --soft: #4d5965; --line: #c3cad1; --field: #6b7783;
  --note: #fff3c4; --note-ink: #4a3800; --stop: #a31621; --focus: #0b57d0;
}
@media (prefers-color-scheme: dark) {
  :root {
    --ground: #14181d; --sheet: #1b2127; --ink: #e8ecef; --soft: #aeb8c2; --line: #3a444e; --field: #8b97a3;
    --note: #3c3413; --note-ink: #f5e6a8; --stop: #ff9a94; --focus: #8ab8ff;
  }
}
* { box-sizing: border-box; }
body { margin: 0; background: var(--ground); color: var(--ink); font: 1rem/1.5 system-ui, sans-serif; }
header { background: var(--note); color: var(--note-ink); border-bottom: 1px solid var(--line); }
header > div, main { max-width: 58rem; margin: 0 auto; padding: 1rem 1.25rem; }
main { padding-block: 2rem 4rem; }
h1 { font-size: 1.25rem; line-height: 1.3; margin: 0; }
h2 { font-size: 1.125rem; margin: 0 0 1rem; }
p { margin: 0 0 1rem; max-width: 60ch; }
header p { margin: .25rem 0 0; max-width: none; }
a { color: inherit; }
p:last-child { margin-bottom: 0; }
.narrow { max-width: 34rem; }
.sheet { background: var(--sheet); border: 1px solid var(--line); padding: 1.5rem; }
.columns { display: grid; gap: 1.5rem; align-items: start; }
@media (min-width: 48rem) { .columns { grid-template-columns: 5fr 6fr; } }
table { width: 100%; border-collapse: collapse; font-variant-numeric: tabular-nums; }
th, td { text-align: left; vertical-align: top; padding: .5rem 0; border-bottom: 1px solid var(--line); font-weight: 400; overflow-wrap: anywhere; }
th + td, th + th, td + td { padding-left: .75rem; }
.amount { text-align: right; white-space: nowrap; }
thead th { color: var(--soft); font-size: .875rem; }
.below { margin-top: 1rem; }
tfoot th, tfoot td { font-weight: 650; font-size: 1.125rem; border-bottom: 0; padding-top: .75rem; }
.field { margin: 0 0 1.25rem; }
label, legend { display: block; font-weight: 600; margin: 0 0 .25rem; padding: 0; }
.hint { color: var(--soft); font-size: .875rem; margin: 0 0 .25rem; }
input, select {
  width: 100%; font: inherit; color: inherit; background: var(--sheet);
  border: 1px solid var(--field); border-radius: 2px; padding: .5rem .625rem; min-height: 2.75rem;
}
input[readonly] { background: var(--ground); }
[aria-invalid="true"] { border: 2px solid var(--stop); }
.fault { color: var(--stop); font-weight: 600; margin: .25rem 0 0; }
.summary { background: var(--sheet); border: 2px solid var(--stop); padding: .75rem 1rem; margin: 0 0 1.25rem; }
.summary p { margin: 0; color: var(--stop); font-weight: 600; }
fieldset { border: 0; margin: 0 0 1.25rem; padding: 0; min-width: 0; }
.samples { display: grid; gap: .5rem; }
button {
  font: inherit; color: var(--ink); background: none; border: 1px solid var(--field); border-radius: 2px;
  padding: .5rem 1rem; min-height: 2.75rem; cursor: pointer;
}
.samples button { display: flex; flex-wrap: wrap; justify-content: space-between; gap: 0 1rem; text-align: left; }
.number { font-variant-numeric: tabular-nums; color: var(--soft); white-space: nowrap; }
button.main { background: var(--ink); color: var(--sheet); border-color: var(--ink); font-weight: 600; }
.actions { display: grid; gap: .75rem; margin-top: 1.75rem; }
.default-action { position: absolute; width: 1px; height: 1px; min-height: 0; padding: 0; border: 0; overflow: hidden; clip-path: inset(50%); }
:focus-visible { outline: 3px solid var(--focus); outline-offset: 2px; }
button:hover { text-decoration: underline; }
.desk { margin: 0 0 1.5rem; }
.desk h2 { margin-bottom: .5rem; }
.desk ul { list-style: none; margin: 0; padding: 0; }
.desk li { display: flex; flex-wrap: wrap; gap: .5rem 1.5rem; align-items: center; justify-content: space-between; padding: .75rem 0; border-top: 1px solid var(--line); }
.desk li p { margin: 0; overflow-wrap: anywhere; flex: 1 1 18rem; }
.desk .hint { margin: 0; }
.forms { display: flex; flex-wrap: wrap; gap: .5rem 1rem; }
.forms form { display: flex; flex-wrap: wrap; gap: .5rem; }
.forms input { width: 6rem; }
.forms select { width: auto; max-width: 100%; }
@media (forced-colors: active) { button, .sheet { border: 1px solid ButtonText; } }
`;
