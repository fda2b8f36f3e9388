import { enMail } from './en-mail';
import { enReport } from './en-report';

/** All that a buyer reads outside the catalogue. Another language follows this type. */
export const en = { report: enReport, mail: enMail };
export type Messages = typeof en;
