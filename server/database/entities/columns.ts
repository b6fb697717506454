import { Column, type ColumnOptions } from 'typeorm';

// The build tools here emit no decorator metadata, so every column says its type in full; these name the usual ones.
export const Text = (length: number, more: ColumnOptions = {}) => Column({ type: 'varchar', length, ...more });
export const Mm = (more: ColumnOptions = {}) => Column({ type: 'double', ...more });
export const Whole = (more: ColumnOptions = {}) => Column({ type: 'int', ...more });
export const Flag = (more: ColumnOptions = {}) => Column({ type: 'boolean', ...more });
/** UTC instant to the millisecond. */
export const Instant = (more: ColumnOptions = {}) => Column({ type: 'datetime', precision: 3, ...more });
export const Json = (more: ColumnOptions = {}) => Column({ type: 'json', ...more });
export const LongText = (more: ColumnOptions = {}) => Column({ type: 'longtext', ...more });
export const Ref = (more: ColumnOptions = {}) => Column({ type: 'uuid', ...more });
