import type { ThemeConfig } from 'ant-design-vue/es/config-provider/context'
import { CORNER, FONT_FAMILY, onPaper, palettes, type, type ThemeName } from './tokens'

/** Ant Design Vue in our ink and paper: square, flat, dense, ruled; slate where one may act, oxide for the filled button. */
export function antTheme(name: ThemeName): ThemeConfig {
  const { ink, quiet, rule, oxide, slate, ochre, moss, desk, slip, field, hover } = palettes[name]
  const { 'field-edge': edge, 'on-oxide': onOxide, shadow } = palettes[name]
  return {
    token: {
      fontFamily: FONT_FAMILY,
      fontSize: type.body,
      lineHeight: 1.4,
      borderRadius: CORNER,
      borderRadiusLG: CORNER,
      borderRadiusSM: CORNER,
      borderRadiusXS: CORNER,
      colorPrimary: slate,
      colorInfo: slate,
      colorLink: slate,
      colorLinkHover: slate,
      colorLinkActive: slate,
      colorError: oxide,
      colorErrorText: oxide,
      colorWarning: ochre,
      colorSuccess: moss,
      colorText: ink,
      colorTextBase: ink,
      colorTextHeading: ink,
      colorTextSecondary: quiet,
      colorTextTertiary: quiet,
      colorTextDescription: quiet,
      colorTextPlaceholder: quiet,
      colorTextDisabled: quiet,
      colorIcon: quiet,
      colorBorder: edge,
      colorBorderSecondary: rule,
      colorSplit: rule,
      colorBgBase: slip,
      colorBgContainer: field,
      colorBgElevated: slip,
      colorBgLayout: desk,
      colorBgContainerDisabled: hover,
      controlItemBgHover: hover,
      controlItemBgActive: onPaper['wash-oxide'],
      controlOutline: 'transparent',
      controlOutlineWidth: 0,
      controlHeight: 30,
      controlHeightSM: 24,
      controlHeightLG: 34,
      lineWidth: 1,
      motionDurationFast: '0.12s',
      motionDurationMid: '0.14s',
      motionDurationSlow: '0.18s',
      boxShadow: 'none',
      boxShadowSecondary: shadow,
      wireframe: false,
    },
    components: {
      Button: {
        colorPrimary: oxide,
        colorPrimaryHover: oxide,
        colorPrimaryActive: oxide,
        colorTextLightSolid: onOxide,
      },
    },
  }
}
