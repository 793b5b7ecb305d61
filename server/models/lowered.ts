import { literal } from 'sequelize';
import { database } from './database';

/** A text in lower case, as PostgreSQL lowers it, to compare a column with: Sequelize's `fn` doubles every `$` in its strings. */
export const lowered = (text: string) => literal(`lower(${database().escape(text)})`);
