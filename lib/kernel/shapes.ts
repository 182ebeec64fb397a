import { z } from 'zod';
import { parseCalendarDate, type CalendarDate } from './calendar-date';

export const regionCode = z
  .string()
  .regex(/^[a-z][a-z0-9]{1,9}(-[a-z0-9]{1,6})?$/, 'A region code is in lower case, such as "dk" or "us-ca"');
export const slug = z
  .string()
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Use lower case letters, digits and hyphens, such as "dk-register"')
  .max(80);
export const words = z.string().trim().min(1, 'This may not be empty');
export const lang = z.string().regex(/^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$/);
export const evidence = z.enum(['read', 'memory']);

export const calendarDate = z.string().transform((text, ctx): CalendarDate => {
  const date = parseCalendarDate(text);
  if (date !== null) return date;
  ctx.addIssue({ code: 'custom', message: 'Give a date as year-month-day, such as 2026-12-01' });
  return z.NEVER;
});
