/** The one style sheet of the stand-ins' pages: light or dark as the browser asks, from 360 px up. */
export const pageStyle = `
:root { color-scheme: light; --paper: #eef1f4; --sheet: #fff; --wash: #e3e8ed; --line: #cfd6dd; --edge: #76808a; --ink: #17212b; --quiet: #51606d; --bad: #a92118; --note: #fff4d6; --note-ink: #5f4300; }
@media (prefers-color-scheme: dark) {
  :root { color-scheme: dark; --paper: #11161b; --sheet: #1a2129; --wash: #26303a; --line: #303b46; --edge: #7b8894; --ink: #e8edf2; --quiet: #a3b0bc; --bad: #ff8f84; --note: #33290f; --note-ink: #f3cf83; }
}
*, *::before, *::after { box-sizing: border-box; }
body { margin: 0; background: var(--paper); color: var(--ink); font: 400 15px/22px system-ui, "Liberation Sans", sans-serif; font-variant-numeric: tabular-nums; }
main { max-width: 960px; margin: 0 auto; padding: 32px 24px 64px; }
main.narrow { max-width: 480px; }
h1 { font-size: 24px; line-height: 30px; font-weight: 600; margin: 0 0 8px; overflow-wrap: anywhere; }
h2 { font-size: 17px; line-height: 24px; font-weight: 600; margin: 32px 0 8px; }
p { margin: 0 0 12px; }
a { color: inherit; text-underline-offset: 3px; }
.quiet { color: var(--quiet); }
.bad { color: var(--bad); }
.code { font-family: ui-monospace, "Liberation Mono", monospace; font-size: 13px; overflow-wrap: anywhere; }
.note { background: var(--note); color: var(--note-ink); border-left: 3px solid currentColor; padding: 8px 12px; margin: 0 0 24px; }
.sheet { background: var(--sheet); border: 1px solid var(--line); border-radius: 8px; padding: 24px; }
.amount { font-size: 34px; line-height: 40px; font-weight: 600; margin: 0 0 16px; }
.scroll { overflow-x: auto; }
table { width: 100%; border-collapse: collapse; }
th { text-align: left; font-weight: 600; font-size: 13px; color: var(--quiet); border-bottom: 1px solid var(--edge); padding: 6px 12px 6px 0; white-space: nowrap; }
td { border-bottom: 1px solid var(--line); padding: 8px 12px 8px 0; vertical-align: top; overflow-wrap: anywhere; }
tbody th { border-bottom-color: var(--line); }
tbody:last-child tr:last-child > * { border-bottom: 0; }
.wide table { min-width: 720px; }
td.fixed { white-space: nowrap; }
.sheet + p, .scroll + p, input + p { margin-top: 12px; }
form.row { margin-bottom: 8px; }
th.num, td.num { text-align: right; padding-right: 0; white-space: nowrap; }
tfoot td { border-bottom: 0; font-weight: 600; }
label { display: block; font-size: 13px; margin: 16px 0 4px; }
input, select { width: 100%; min-height: 44px; font: inherit; color: inherit; background: var(--paper); border: 1px solid var(--edge); border-radius: 6px; padding: 8px 12px; }
input[readonly] { font-family: ui-monospace, "Liberation Mono", monospace; }
.pair { display: grid; grid-template-columns: 1fr 1fr; gap: 0 16px; }
button { min-height: 44px; font: inherit; font-weight: 600; color: var(--ink); background: transparent; border: 1px solid var(--edge); border-radius: 6px; padding: 8px 16px; cursor: pointer; }
button:hover { background: var(--wash); }
button.main { width: 100%; background: var(--ink); border-color: var(--ink); color: var(--paper); margin: 24px 0 12px; }
button.main:hover { opacity: .88; }
.row { display: flex; flex-wrap: wrap; gap: 8px 12px; align-items: end; }
.row > button { flex: 1 1 120px; }
.row > div { flex: 1 1 140px; }
td form { display: inline-block; margin: 0 4px 4px 0; }
td button { min-height: 32px; padding: 2px 10px; font-weight: 400; }
form.sheet { margin-bottom: 12px; padding: 16px; }
form.sheet label:first-child { margin-top: 0; }
form.sheet .row label { margin-top: 0; }
:focus-visible { outline: 2px solid var(--ink); outline-offset: 2px; }
iframe { width: 100%; height: 420px; border: 1px solid var(--line); border-radius: 6px; background: #fff; }
pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; margin: 0; }
@media (max-width: 480px) { main { padding: 20px 16px 48px; } .sheet { padding: 16px; } }
`
