/**
 * The look of a review: neutral grays alone, so that only light and data have color; white paper with black type, and dark
 * slabs of L* = 10 (#1c1c1c) where a switched-off screen is meant. One family, that of the charts; where it is missing, the
 * face nearest in its proportions takes its name, for text and live charts alike.
 */
export const STYLE = `
@font-face {
  font-family: "DejaVu Sans";
  src: local("DejaVu Sans"), local("Verdana"), local("Segoe UI"), local("Helvetica Neue"), local("Arial");
}
@font-face {
  font-family: "DejaVu Sans"; font-weight: bold;
  src: local("DejaVu Sans Bold"), local("Verdana Bold"), local("Segoe UI Bold"), local("Helvetica Neue Bold"), local("Arial Bold");
}
:root { color-scheme: light; -webkit-print-color-adjust: exact; print-color-adjust: exact; }
* { box-sizing: border-box; }
body { margin: 0; background: #fff; color: #1a1a1a; font: 15px/1.55 "DejaVu Sans", sans-serif; font-variant-numeric: tabular-nums; }
header, main, footer { padding: 0 max(24px, calc((100vw - 1040px) / 2)); }
header { background: #1c1c1c; color: #e2e2e2; padding-top: 40px; padding-bottom: 36px; }
header p { margin: 0; font-size: 13px; color: #b4b4b4; }
h1 { margin: 6px 0 28px; font-size: 26px; font-weight: normal; line-height: 1.3; color: #fff; overflow-wrap: anywhere; }
.verdict { display: flex; flex-wrap: wrap; gap: 14px 44px; margin: 0; padding: 0; list-style: none; font-size: 13px; color: #b4b4b4; }
.verdict b { display: block; font-size: 22px; font-weight: normal; line-height: 1.35; color: #fff; }
.verdict small { font-size: 15px; color: #b4b4b4; }
section { padding: 36px 0 12px; border-bottom: 1px solid #d0d0d0; }
section:last-child { border: 0; }
h2 { margin: 0 0 18px; font-size: 20px; font-weight: normal; }
h2 span { display: inline-block; min-width: 34px; color: #767676; }
h3 { margin: 20px 0 6px; font-size: 15px; }
p { margin: 0 0 12px; max-width: 78ch; }
ul { margin: 0 0 12px; padding-left: 20px; }
li { max-width: 92ch; }
dl { display: grid; grid-template-columns: 150px 1fr; gap: 6px 18px; margin: 0 0 20px; }
dt { color: #555; }
dd { margin: 0; overflow-wrap: anywhere; }
dd ul { padding: 0; margin: 0; list-style: none; }
.note { font-size: 13px; color: #555; }
.wide { overflow-x: auto; margin: 0 0 22px; }
table { border-collapse: collapse; font-size: 13.5px; }
caption { padding: 0 0 6px; text-align: left; font-weight: bold; }
th { font-weight: normal; }
thead th { vertical-align: bottom; color: #555; border-bottom: 1px solid #767676; }
th, td { padding: 3px 26px 3px 0; border-bottom: 1px solid #e6e6e6; }
th:last-child, td:last-child { padding-right: 0; }
.words { text-align: left; }
.number { text-align: right; }
td, tbody th { white-space: nowrap; }
.missed { font-weight: bold; }
.missed::before { content: "✕ "; }
.met::before { content: "✓ "; }
.charts { display: grid; grid-template-columns: minmax(0, 1fr); gap: 20px; margin: 0 0 26px; }
.pairs { grid-template-columns: repeat(2, minmax(0, 1fr)); }
.single { max-width: 640px; }
.chart { position: relative; margin: 0; }
.chart img, .chart canvas { display: block; width: 100%; height: auto; }
.laminate { display: block; width: 100%; height: auto; margin-bottom: 20px; font: 13.5px "DejaVu Sans", sans-serif; fill: #1a1a1a; }
.laminate .name { font-weight: bold; }
.laminate .note { fill: #555; font-size: 12.5px; }
.laminate .hand { stroke: #1a1a1a; stroke-width: 2.5; }
.laminate .finger { stroke: #1a1a1a; }
.laminate .past { stroke: #767676; stroke-width: 1.5; stroke-dasharray: 3 3; }
.booth { margin: 0 0 12px; padding: 22px 24px 6px; background: #1c1c1c; color: #c8c8c8; font-size: 13px; }
.row { display: flex; align-items: flex-start; margin-bottom: 20px; }
.row > p { flex: 0 0 220px; padding-right: 20px; margin: 0; }
.row b { color: #fff; font-weight: normal; }
.tile { flex: 1 1 0; min-width: 0; }
.patch { height: 96px; }
.tile p { margin: 8px 10px 0 0; line-height: 1.45; overflow-wrap: anywhere; }
footer { padding-top: 18px; padding-bottom: 40px; font-size: 13px; color: #555; overflow-wrap: anywhere; }
code { font: inherit; }
.live img { display: none; }
@media (max-width: 760px) { .pairs { grid-template-columns: minmax(0, 1fr); } dl { grid-template-columns: minmax(0, 1fr); } .row { flex-wrap: wrap; } .row > p { flex-basis: 100%; padding: 0 0 8px; } }
@page { margin: 16mm 16mm 18mm; }
@media print {
  body { font-size: 9pt; }
  header, main, footer { padding-left: 0; padding-right: 0; }
  header { padding: 6mm 8mm; } h1 { margin: 1mm 0 5mm; }
  h1 { font-size: 16pt; }
  h2 { font-size: 13pt; break-after: avoid; }
  h3 { font-size: 9.5pt; break-after: avoid; }
  section { padding: 7mm 0 0; border: 0; }
  .verdict { gap: 4mm 9mm; font-size: 8pt; } .verdict b { font-size: 13pt; } .verdict small { font-size: 9pt; }
  .wide { overflow: visible; break-inside: avoid; margin-bottom: 5mm; }
  p { break-inside: avoid; }
  table { font-size: 8pt; } th, td { padding-right: 4mm; } tr { break-inside: avoid; } caption { break-after: avoid; }
  .note { font-size: 7.5pt; }
  .pairs { grid-template-columns: repeat(2, minmax(0, 1fr)); }
  .keep, .charts, .laminate, .booth { break-inside: avoid; }
  .charts { margin-bottom: 5mm; }
  .live img { display: block; }
  .live canvas { display: none !important; }
  .booth { font-size: 7.5pt; } .row { flex-wrap: nowrap; } .row > p { flex: 0 0 42mm; } .patch { height: 15mm; } .booth { padding: 4mm 5mm 1mm; } .row { margin-bottom: 3mm; }
  dl { grid-template-columns: 30mm 1fr; margin-bottom: 2mm; gap: 1mm 4mm; }
  .single { max-width: 130mm; }
}
`
