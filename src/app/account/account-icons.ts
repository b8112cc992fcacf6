import visibility from '@material-symbols/svg-400/outlined/visibility.svg';
import visibilityOff from '@material-symbols/svg-400/outlined/visibility_off.svg';

/** Icons of the account's pages. Material Symbols, Apache-2.0. */
export const ACCOUNT_ICONS = { hide: visibilityOff, show: visibility } as const;
