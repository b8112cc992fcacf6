import accountCircle from '@material-symbols/svg-400/outlined/account_circle.svg';
import cloudOff from '@material-symbols/svg-400/outlined/cloud_off.svg';
import contrast from '@material-symbols/svg-400/outlined/contrast.svg';
import darkMode from '@material-symbols/svg-400/outlined/dark_mode.svg';
import desktop from '@material-symbols/svg-400/outlined/desktop_windows.svg';
import lightMode from '@material-symbols/svg-400/outlined/light_mode.svg';
import warning from '@material-symbols/svg-400/outlined/warning.svg';

/** Icons of the frame around every page. Material Symbols, Apache-2.0. */
export const SHELL_ICONS = {
  account: accountCircle,
  appearance: contrast,
  dark: darkMode,
  light: lightMode,
  offline: cloudOff,
  system: desktop,
  warning,
} as const;
