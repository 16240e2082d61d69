import { Column, PrimaryColumn, type ColumnOptions } from 'typeorm';

// The column kinds that tables here are made of, so that each is declared the same way everywhere: uuid ids (never
// ordered by), millisecond UTC times, SI doubles, exact texts.

export const IdColumn = (): PropertyDecorator => PrimaryColumn({ type: 'uuid' });

export const RefColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'uuid', ...options });

export const TextColumn = (length: number, options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'varchar', length, ...options });

/** Ascii words and hashes: compared byte by byte, never by a language's rules. */
export const WordColumn = (length: number, options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'varchar', length, charset: 'ascii', collation: 'ascii_bin', ...options });

export const HashColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'char', length: 64, charset: 'ascii', collation: 'ascii_bin', ...options });

/** Any text, kept to the byte; JSON that is hashed stays in the form it was hashed in. */
export const LongTextColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'longtext', charset: 'utf8mb4', collation: 'utf8mb4_bin', ...options });

export const DoubleColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'double', ...options });

export const IntColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'int', ...options });

export const BooleanColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'boolean', ...options });

export const TimeColumn = (options: ColumnOptions = {}): PropertyDecorator =>
  Column({ type: 'datetime', precision: 3, ...options });
