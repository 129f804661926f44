/** What can be asked of the menu. */
export type HandOnAction =
  | 'present'
  | 'print-chord'
  | 'print-progression'
  | 'png'
  | 'svg'
  | 'partials'
  | 'pairs'
  | 'sound'
  | 'study-file'
  | 'open-file';
