import add from '@material-symbols/svg-400/outlined/add.svg';
import arrowBack from '@material-symbols/svg-400/outlined/arrow_back.svg';
import arrowDownward from '@material-symbols/svg-400/outlined/arrow_downward.svg';
import arrowForward from '@material-symbols/svg-400/outlined/arrow_forward.svg';
import arrowUpward from '@material-symbols/svg-400/outlined/arrow_upward.svg';
import close from '@material-symbols/svg-400/outlined/close.svg';
import deleteIcon from '@material-symbols/svg-400/outlined/delete.svg';
import fileMove from '@material-symbols/svg-400/outlined/drive_file_move.svg';
import arrowDown from '@material-symbols/svg-400/outlined/keyboard_arrow_down.svg';
import arrowRight from '@material-symbols/svg-400/outlined/keyboard_arrow_right.svg';
import libraryAdd from '@material-symbols/svg-400/outlined/library_add.svg';
import moreVert from '@material-symbols/svg-400/outlined/more_vert.svg';
import powerSettings from '@material-symbols/svg-400/outlined/power_settings_new.svg';
import print from '@material-symbols/svg-400/outlined/print.svg';
import redo from '@material-symbols/svg-400/outlined/redo.svg';
import splitscreen from '@material-symbols/svg-400/outlined/splitscreen.svg';
import swapVert from '@material-symbols/svg-400/outlined/swap_vert.svg';
import undo from '@material-symbols/svg-400/outlined/undo.svg';
import visibility from '@material-symbols/svg-400/outlined/visibility.svg';

/** Icons of the editor. Material Symbols, Apache-2.0. */
export const EDITOR_ICONS = {
  add,
  close,
  'copy-to': fileMove,
  duplicate: libraryAdd,
  fold: arrowDown,
  mirror: swapVert,
  more: moreVert,
  'move-down': arrowDownward,
  'move-left': arrowBack,
  'move-right': arrowForward,
  'move-up': arrowUpward,
  print,
  redo,
  remove: deleteIcon,
  split: splitscreen,
  'switch-off': powerSettings,
  'switch-on': visibility,
  undo,
  unfold: arrowRight,
} as const;
