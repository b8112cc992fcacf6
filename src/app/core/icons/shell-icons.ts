import accountCircle from '@material-symbols/svg-400/outlined/account_circle.svg';
import cloudOff from '@material-symbols/svg-400/outlined/cloud_off.svg';
import contrast from '@material-symbols/svg-400/outlined/contrast.svg';
import warning from '@material-symbols/svg-400/outlined/warning.svg';

/** Icons of the frame around every page. Material Symbols, Apache-2.0. */
export const SHELL_ICONS = {
  account: accountCircle,
  appearance: contrast,
  offline: cloudOff,
  warning,
} as const;
