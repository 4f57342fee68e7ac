const css = `
.stage-pin { position: absolute; left: -13px; top: -10px; width: 26px; height: 20px; padding: 0 0 0 7px; margin: 0; border: 0; border-radius: 0; text-align: left;
  font: 600 12px/20px var(--font-fig); pointer-events: auto; cursor: pointer; color: var(--on-ink); background: var(--pencil);
  clip-path: polygon(0 0, 100% 0, 80% 50%, 100% 100%, 0 100%); }
.stage-pin.washed { background: var(--pencil-wash); color: var(--ink); }
.stage-pin.outline { width: 24px; clip-path: none; padding-left: 5px; line-height: 17px; border: 1.5px solid var(--pencil); background: var(--paper); color: var(--pencil); }
.stage-pin.on { text-decoration: underline; text-decoration-thickness: 2px; text-underline-offset: 2px; }
`

let sheet: CSSStyleSheet | null = null

export function adoptPinStyle(): void {
  if (!sheet) {
    sheet = new CSSStyleSheet()
    sheet.replaceSync(css)
  }
  if (!document.adoptedStyleSheets.includes(sheet)) document.adoptedStyleSheets.push(sheet)
}
