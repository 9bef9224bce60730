import { Button, MessageBar, MessageBarActions, MessageBarBody } from '@fluentui/react-components';
import { fieldRegistry, RECEIVER_KINDS, receiverSchema } from '@noonwell/schema';
import { useFormContext, useWatch } from 'react-hook-form';
import { loopAdvice } from './model/advice.js';
import { draftText, type Draft } from './model/draft.js';
import { formPath } from './model/form-values.js';

/** Offers the loop settings that suit a receiver which was switched. */
export function LoopAdvice({ className }: { className: string }) {
  const { setValue } = useFormContext();
  const draft = useWatch({ name: 'document' }) as Draft;
  const kind = draftText(draft, 'catch.receiver.kind');
  const receiver = RECEIVER_KINDS.find((one) => one === kind);
  const others = RECEIVER_KINDS.filter((one) => one !== kind);
  const advice = receiver === undefined ? [] : others.flatMap((other) => loopAdvice(draft, receiver, other));
  if (receiver === undefined || advice.length === 0) return null;
  const name = fieldRegistry.get(receiverSchema)?.choices?.[receiver] ?? receiver;
  return (
    <MessageBar intent="info" layout="multiline" className={className}>
      <MessageBarBody style={{ whiteSpace: 'normal' }}>
        {name}. A new scenario with it has{' '}
        {advice
          .map(({ label, to, from, unit }) => `${label.toLowerCase()} ${to} ${unit} (here ${from})`)
          .join(', ')}
        .
      </MessageBarBody>
      <MessageBarActions>
        <Button
          onClick={() => {
            for (const { path, to } of advice) {
              setValue(formPath(path), to, { shouldDirty: true, shouldValidate: true });
            }
          }}
        >
          Take these
        </Button>
      </MessageBarActions>
    </MessageBar>
  );
}
