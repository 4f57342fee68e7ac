/** How the stage's layers lie over one another and how what is written on them looks; one sheet a document. */
const css = `
.stage-layer { position: absolute; inset: 0; width: 100%; height: 100%; display: block; }
.stage-over { pointer-events: none; }
.stage-surface { touch-action: none; cursor: grab; }
.stage-surface:active { cursor: grabbing; }
.stage-written { overflow: hidden; }
.stage-label { position: absolute; left: 0; top: 0; white-space: nowrap; will-change: transform; font: 500 13px/16px var(--font-fig); color: var(--ink);
  text-shadow: 0 0 2px var(--paper), 0 0 2px var(--paper), 0 0 3px var(--paper); }
.stage-label.bank { font: 700 16px/20px var(--font-head); }
.stage-label.minor { font: 400 12px/16px var(--font-text); color: var(--ink-2); }
.stage-label.fire { font: 550 12px/16px var(--font-text); color: var(--fire); }
.stage-label.lit { color: var(--pencil); font: 550 13px/16px var(--font-text); }
.stage-label[hidden] { display: none; }
.stage-balloon { position: absolute; left: -12px; top: -12px; z-index: 1; width: 24px; height: 24px; padding: 0; margin: 0; border-radius: 50%;
  border: 1.1px solid var(--ink); background: var(--paper); color: var(--ink); font: 500 12px/1 var(--font-fig); text-align: center; pointer-events: auto; cursor: pointer; }
.stage-balloon.on { background: var(--ink); color: var(--on-ink); }
.stage-balloon.bad { border: 2px solid var(--pencil); color: var(--pencil); }
.stage-balloon[hidden] { display: none; }
.stage-balloon:focus-visible { outline: 2px solid var(--ink); outline-offset: 2px; }
`

let sheet: CSSStyleSheet | null = null

export function adoptSheetStyle(): void {
  if (!sheet) {
    sheet = new CSSStyleSheet()
    sheet.replaceSync(css)
  }
  if (!document.adoptedStyleSheets.includes(sheet)) document.adoptedStyleSheets.push(sheet)
}
