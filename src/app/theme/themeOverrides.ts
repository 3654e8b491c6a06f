import type { GlobalThemeOverrides } from 'naive-ui'
import { attic, paper, type Palette } from './tokens.ts'

const ui = '"Atkinson Hyperlegible Next Variable", system-ui, sans-serif'
const mono = '"Atkinson Hyperlegible Mono Variable", ui-monospace, monospace'

/** Naive UI in our colours: graphite for what is chosen, orange only on the one main button, lines instead of shadows. */
function overrides(p: Palette): GlobalThemeOverrides {
  const edge = `0 0 0 1.5px ${p.graphite}`
  return {
    common: {
      fontFamily: ui, fontFamilyMono: mono, fontWeightStrong: '650', fontSize: '14px', fontSizeMedium: '14px', fontSizeSmall: '13px', fontSizeTiny: '12px', lineHeight: '1.43',
      heightSmall: '26px', heightMedium: '32px', heightLarge: '48px', borderRadius: '6px', borderRadiusSmall: '3px',
      bodyColor: p.gypsum, cardColor: p.sheet, modalColor: p.sheet, popoverColor: p.sheet, tableColor: p.sheet, inputColor: p.sheet, tableHeaderColor: p.gypsum, hoverColor: p.gypsum, actionColor: p.joint,
      dividerColor: p.stud1, borderColor: p.stud3, textColorBase: p.graphite, textColor1: p.graphite, textColor2: p.graphite, textColor3: p.graphite3, placeholderColor: p.graphite3, iconColor: p.graphite3,
      textColorDisabled: p.graphite3, opacityDisabled: '1', primaryColor: p.graphite, primaryColorHover: p === paper ? '#000000' : '#FFFFFF', primaryColorPressed: p.graphite2, primaryColorSuppl: p.graphite,
      infoColor: p.chalk, successColor: p.tested, warningColor: p.cautionInk, errorColor: p.stop, boxShadow1: edge, boxShadow2: edge, boxShadow3: edge,
    },
    Dialog: { color: p.sheet, titleFontWeight: '700', borderRadius: '6px' },
    Drawer: { color: p.sheet, titleFontWeight: '700', headerBorderBottom: `1.5px solid ${p.graphite}`, footerBorderTop: `1.5px solid ${p.graphite}`, boxShadow: edge },
    Tooltip: { color: p.graphite, textColor: p.onGraphite, borderRadius: '6px' },
    Message: { boxShadow: edge },
  }
}

export const paperOverrides = overrides(paper)
export const atticOverrides = overrides(attic)
