import type { ComponentProps } from 'react';
import { TextInput } from './text-input';

type NativeDateProps = Omit<ComponentProps<typeof TextInput>, 'type'>;

/** The platform's calendar for a date; the value is `YYYY-MM-DD`. */
export const DateInput = (props: NativeDateProps) => <TextInput {...props} type="date" />;

/** The platform's calendar and clock; the value is `YYYY-MM-DDTHH:MM` in the clinic's zone (see `fromLocalInput`). */
export const DateTimeInput = (props: NativeDateProps) => <TextInput {...props} type="datetime-local" />;
