/** Plain on purpose, and plainly not the provider's own page. Colours are the product's light tokens. */
export const STYLE = `
:root { --paper: #f5efe2; --card: #fcf9f2; --ink: #161b2b; --ink2: #434656; --rule: #cdbfa4; --edge: #81755f;
  --enamel: #1c2f9e; --deep: #131f6e; --crimson: #8e0f33; --crimson-wash: #f7dadd; --ochre: #614000; --ochre-wash: #f6e4b4; }
* { box-sizing: border-box; }
body { margin: 0; background: var(--paper); color: var(--ink); font: 16px/24px system-ui, sans-serif; }
.strip { padding: 8px 16px; background: var(--ochre-wash); color: var(--ochre); border-bottom: 2px solid var(--ochre); text-align: center; }
main { max-width: 920px; margin: 0 auto; padding: 24px 16px 72px; display: grid; gap: 32px; }
main.narrow { max-width: 520px; }
h1, h2 { font-family: Georgia, serif; line-height: 1.25; margin: 0 0 12px; }
h1 { font-size: 28px; } h2 { font-size: 20px; }
p { margin: 0 0 12px; }
a { color: var(--enamel); }
table { width: 100%; border-collapse: collapse; }
caption { text-align: left; font-weight: 700; padding-bottom: 8px; border-bottom: 2px solid var(--ink); }
th, td { text-align: left; font-weight: 400; padding: 8px 0; border-bottom: 1px solid var(--rule); vertical-align: top; }
td { text-align: right; white-space: nowrap; padding-left: 12px; font-variant-numeric: tabular-nums; }
tfoot th, tfoot td { font-weight: 700; border-bottom: 0; }
.small { color: var(--ink2); font-size: 14px; line-height: 20px; display: block; }
.field { margin-bottom: 16px; }
label { display: block; font-weight: 600; margin-bottom: 4px; }
input { width: 100%; min-height: 44px; padding: 8px 12px; font: inherit; color: var(--ink); background: var(--card);
  border: 1.5px solid var(--edge); border-radius: 6px; }
input[aria-invalid] { border-color: var(--crimson); }
.pair { display: grid; grid-template-columns: 1fr 1fr; gap: 16px; }
.wrong { color: var(--crimson); font-size: 14px; line-height: 20px; margin: 4px 0 0; }
.panel { background: var(--crimson-wash); color: var(--crimson); border: 1.5px solid var(--crimson); border-radius: 8px; padding: 12px 16px; margin-bottom: 16px; }
.panel p:last-child { margin: 0; } .panel a { color: inherit; }
button { min-height: 48px; padding: 8px 24px; font: inherit; font-weight: 600; border-radius: 6px; border: 1.5px solid var(--ink);
  background: var(--card); color: var(--ink); cursor: pointer; }
button.main { width: 100%; color: #fcf9f2; background: var(--enamel); border-color: var(--enamel); box-shadow: 0 3px 0 var(--deep); }
button.main:active { transform: translateY(2px); box-shadow: none; }
.row { display: flex; flex-wrap: wrap; gap: 12px; } .row button { flex: 1 1 200px; }
.back { margin-top: 20px; }
ul.cards { list-style: none; margin: 0; padding: 0; font-size: 14px; line-height: 20px; }
ul.cards li { display: flex; flex-wrap: wrap; gap: 0 12px; justify-content: space-between; padding: 6px 0; border-bottom: 1px solid var(--rule); }
ul.cards code { font-size: 14px; }
:focus-visible { outline: 3px solid var(--enamel); outline-offset: 2px; }
@media (min-width: 760px) { main.wide { grid-template-columns: 1fr 1fr; grid-template-rows: auto 1fr; } .till { grid-row: span 2; } }
`;
