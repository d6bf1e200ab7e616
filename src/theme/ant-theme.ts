import { theme as ant } from 'ant-design-vue'
import type { ThemeConfig } from 'ant-design-vue/es/config-provider/context'
import { CORNER, FONT_FAMILY, palettes, type, type ThemeName } from './tokens'

/** Ant Design Vue in our ink and paper. */
export function antTheme(name: ThemeName): ThemeConfig {
  const { ink, quiet, rule, oxide, slate, ochre, moss, slip, field, hover } = palettes[name]
  return {
    algorithm: name === 'dark' ? ant.darkAlgorithm : ant.defaultAlgorithm,
    token: {
      fontFamily: FONT_FAMILY,
      fontSize: type.body,
      borderRadius: CORNER,
      borderRadiusLG: CORNER,
      borderRadiusSM: CORNER,
      colorPrimary: oxide,
      colorLink: slate,
      colorLinkHover: ink,
      colorLinkActive: ink,
      colorError: oxide,
      colorWarning: ochre,
      colorSuccess: moss,
      colorInfo: slate,
      colorText: ink,
      colorTextSecondary: quiet,
      colorTextDescription: quiet,
      colorTextPlaceholder: quiet,
      colorBorder: rule,
      colorBorderSecondary: rule,
      colorBgContainer: field,
      colorBgElevated: slip,
      colorBgLayout: slip,
      controlItemBgHover: hover,
      controlItemBgActive: hover,
      controlOutline: 'transparent',
      controlHeight: 30,
      lineWidth: 1,
      motionDurationMid: '0.14s',
      motionDurationSlow: '0.18s',
      wireframe: false,
      boxShadow: 'none',
      boxShadowSecondary: '0 8px 24px rgb(40 30 15 / 22%)',
    },
    components: {
      Button: { controlTmpOutline: 'transparent' } as object,
      Table: { colorBgContainer: 'transparent', colorFillAlter: 'transparent' },
    },
  }
}
