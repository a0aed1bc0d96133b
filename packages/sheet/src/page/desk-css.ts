// Style rules of the live sheet: fields in a sentence, states in the margin, what waits to be computed, changes.

export const deskCss: string = `
.field{display:inline}
input.in,select.in{font:inherit;font-variant-numeric:lining-nums tabular-nums;color:var(--ink);border:0;border-bottom:1.5px solid var(--deep);border-radius:0;margin:0;padding:0 4px;max-width:100%;field-sizing:content;min-width:1.6em;height:1.5em;line-height:1.3}
select.in{appearance:none;cursor:pointer;text-overflow:ellipsis}
select.in option{background:var(--paper);color:var(--ink)}
h1 input.in,.case-name input.in{font-weight:600}
h1 input.in{height:auto;letter-spacing:inherit}
.in[aria-invalid]{border-bottom-style:dashed;border-bottom-color:var(--beyond)}
.in:focus-visible,.word:focus-visible,textarea:focus-visible{outline:2px solid var(--deep);outline-offset:1px}
.body:focus{outline:none}
.in::placeholder{color:var(--soft);opacity:1;font-weight:400}
.complaint,.word,.edits,.state,.input-faults,.pasting label,.change,.place{font-family:ui-sans-serif,"Inter","Helvetica Neue",Arial,"DejaVu Sans",sans-serif}
.complaint{font-size:12.5px;color:var(--beyond);margin-left:.3em}
.input-faults{margin:0 0 12px;padding:0 0 0 14px;list-style:none;border-left:3px solid var(--beyond);font-size:12.5px;color:var(--beyond);overflow-wrap:anywhere;max-width:58em}
.word{appearance:none;background:none;border:0;margin:0;padding:2px 0;font-size:12.5px;line-height:1.4;color:var(--deep);text-decoration:underline dotted 1px;text-underline-offset:3px;cursor:pointer;text-align:inherit;font-variant-numeric:lining-nums tabular-nums}
.edits{display:block}
.edits .word{margin-right:14px;padding:4px 0}
.pasting{margin-bottom:14px}
.scroll+.download,.verdicts+.download{display:block;margin:-8px 0 14px}
.verdicts .word,.scroll .word{font-size:inherit}
.verdicts .place{color:var(--soft);white-space:nowrap;font-weight:400}
.not-yet{min-height:12em}
details .not-yet{min-height:0}
.state{margin:0 0 3px;font-size:12.5px;color:var(--soft);font-style:italic}
.fault>.margin .state{color:var(--beyond)}
.change{font-weight:400;font-size:.8em;color:var(--soft);white-space:nowrap}
.verdicts :is(.worst,.best) .change{display:block}
.computing>.body,.stale>.body,.fault>.body,.title-block.computing,.title-block.stale,.title-block.fault{color:var(--soft)}
:is(.computing,.stale,.fault)>.body :is(figure>svg,.bar-line){filter:grayscale(1) opacity(.55)}
:is(.computing,.stale,.fault) :is(.soils-told span,.answer strong,.answer.beyond strong,.verdicts .beyond .finding,.verdicts .beyond .worst){color:var(--soft)}
.pasting label{display:block;font-size:12.5px;color:var(--soft)}
.pasting textarea{font:12.5px/1.5 ui-monospace,"DejaVu Sans Mono",monospace;width:100%;max-width:43em;color:var(--ink);background:var(--field);border:0;border-bottom:1.5px solid var(--deep);border-radius:0}
.fig .pinned-tick{fill:var(--paper);stroke:var(--ink);stroke-width:1.2}
.fig .change-line{stroke:var(--ink);stroke-width:.7;stroke-opacity:.6}
.fig .change-iso{stroke-opacity:.7}
.fig .edge-box{stroke:var(--soft);stroke-width:.6}
@media (prefers-reduced-motion:no-preference){.part>.body,.title-block{transition:color .2s}.part>.body figure>svg{transition:filter .2s}}
@media print{.word:not(.to-place),.edits,.state,.pasting>.fold{display:none}.to-place{color:inherit;text-decoration:none;font:inherit}input.in,select.in{height:auto}}
`.trim();
