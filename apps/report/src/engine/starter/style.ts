// Style rules of the strip above a sheet that can compute itself, and of the marks in it.

export const starterCss: string = `
.recompute{max-width:1096px;margin:20px auto -8px;padding:0 60px;font:13px/1.5 ui-sans-serif,"Inter","Helvetica Neue",Arial,"DejaVu Sans",sans-serif;color:var(--soft)}
.recompute p{margin:0 0 6px}
.recompute button{font:inherit;color:var(--deep);background:none;border:1px solid var(--deep);border-radius:2px;padding:2px 10px;cursor:pointer}
.recompute button:disabled{color:var(--soft);border-color:var(--rule);cursor:default}
.recompute button:focus-visible,.recompute input:focus-visible,.recompute summary:focus-visible{outline:2px solid var(--deep);outline-offset:2px}
.recompute [role=status]{color:var(--ink);font-weight:600}
.recompute .contradicted,
.recompute [role=alert]{color:var(--beyond)}
.recompute .differs{font-weight:600}
.recompute ul{margin:4px 0 8px;padding-left:18px;color:var(--ink)}
.recompute li button{padding:0 6px;font-size:12px}
.recompute progress{vertical-align:middle;width:160px}
.recompute summary{cursor:pointer;color:var(--deep)}
.recompute .fields{columns:2 330px;column-gap:36px;margin:10px 0}
.recompute fieldset{border:0;padding:0;margin:0 0 12px;break-inside:avoid}
.recompute legend{padding:0;color:var(--ink);font-weight:600}
.recompute .fields p{display:flex;gap:10px;align-items:baseline;margin:0}
.recompute .fields label{flex:1;overflow-wrap:anywhere}
.recompute input{font:inherit;width:8em;text-align:right;color:var(--ink);background:var(--field);border:0;border-bottom:1.5px solid var(--deep);padding:2px 4px}
.recompute input[aria-invalid]{border-color:var(--beyond)}
.recompute table{width:auto;margin:6px 0;color:var(--ink)}
[data-recomputed]{outline:2px solid var(--beyond);outline-offset:2px}
.sheet [data-recomputed]::after{content:" [recomputed: " attr(data-recomputed) "]";color:var(--beyond);font-weight:600}
svg [data-recomputed]{fill:var(--beyond);text-decoration:line-through}
@media (max-width:860px){.recompute{padding:0 32px}}
@media (max-width:700px){.recompute{padding:0 18px}.recompute .fields{columns:1}}
@media print{.recompute{display:none}}
`.trim();
