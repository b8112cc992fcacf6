import add from '@material-symbols/svg-400/outlined/add.svg';
import close from '@material-symbols/svg-400/outlined/close.svg';
import copy from '@material-symbols/svg-400/outlined/content_copy.svg';
import deleteIcon from '@material-symbols/svg-400/outlined/delete.svg';
import search from '@material-symbols/svg-400/outlined/search.svg';

/** Icons of the bench. Material Symbols, Apache-2.0. */
export const BENCH_ICONS = { add, close, copy, delete: deleteIcon, search } as const;
