import { Button, Field, makeStyles, Select } from '@fluentui/react-components';
import { ChevronLeftRegular, ChevronRightRegular } from '@fluentui/react-icons';
import { LONG_MONTH_NAMES } from '../../shared/format/date.js';
import type { CalendarDay, Week } from './model/weeks.js';

const useStyles = makeStyles({
  root: { display: 'flex', flexWrap: 'wrap', alignItems: 'end', gap: '8px' },
  month: { minWidth: '128px' },
  day: { minWidth: '72px' },
});

interface WeekChoiceProps {
  days: readonly CalendarDay[];
  week: Week;
  onDay: (day: CalendarDay) => void;
  onStep: (days: number) => void;
}

/** The week's first day by month and day: a typical year has no year that a calendar could show. */
export function WeekChoice({ days, week, onDay, onStep }: WeekChoiceProps) {
  const styles = useStyles();
  const month = week.from.slice(0, 2);
  const months = [...new Set(days.map((day) => day.slice(0, 2)))];
  const daysOfMonth = days.filter((day) => day.startsWith(month));
  return (
    <div className={styles.root} role="group" aria-label="Week shown">
      <Button
        icon={<ChevronLeftRegular />}
        aria-label="A week earlier"
        disabled={week.from === days[0]}
        onClick={() => {
          onStep(-7);
        }}
      />
      <Field label="Week from" className={styles.month}>
        <Select
          value={month}
          onChange={(_, { value }) => {
            const first = days.find((day) => day.startsWith(value));
            if (first !== undefined) onDay(first);
          }}
        >
          {months.map((value) => (
            <option key={value} value={value}>
              {LONG_MONTH_NAMES[Number(value) - 1]}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Day" className={styles.day}>
        <Select
          value={week.from}
          onChange={(_, { value }) => {
            const chosen = days.find((day) => day === value);
            if (chosen !== undefined) onDay(chosen);
          }}
        >
          {daysOfMonth.map((day) => (
            <option key={day} value={day}>
              {Number(day.slice(3))}
            </option>
          ))}
        </Select>
      </Field>
      <Button
        icon={<ChevronRightRegular />}
        aria-label="A week later"
        disabled={week.to === days.at(-1)}
        onClick={() => {
          onStep(7);
        }}
      />
    </div>
  );
}
