import { Button, Field, Input, makeStyles, Spinner } from '@fluentui/react-components';
import { zodResolver } from '@hookform/resolvers/zod';
import { signInRequestSchema, type SignInRequest } from '@noonwell/schema';
import { useMutation } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { signIn } from '../../shared/api/auth.js';
import { ErrorState } from '../../shared/components/error-state.js';

const useStyles = makeStyles({
  form: { display: 'grid', gap: '14px' },
  button: { justifySelf: 'start' },
});

/** E-mail address and password of a real account. */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const styles = useStyles();
  const form = useForm<SignInRequest>({
    resolver: zodResolver(signInRequestSchema),
    defaultValues: { email: '', password: '' },
  });
  const entering = useMutation({ mutationFn: signIn, onSuccess: onSignedIn });
  const { errors } = form.formState;
  return (
    <form
      className={styles.form}
      noValidate
      aria-label="Sign in with an account"
      onSubmit={(event) => {
        void form.handleSubmit((values) => {
          entering.mutate(values);
        })(event);
      }}
    >
      <Field
        label="E-mail address"
        required
        validationMessage={errors.email && 'Enter an e-mail address such as name@example.org.'}
      >
        <Input type="email" autoComplete="username" {...form.register('email')} />
      </Field>
      <Field label="Password" required validationMessage={errors.password && 'Enter your password.'}>
        <Input type="password" autoComplete="current-password" {...form.register('password')} />
      </Field>
      {entering.isError && (
        <ErrorState
          what="You are not signed in."
          error={entering.error}
          nextByStatus={{ 401: 'Check both and try again. An administrator of your workspace can help.' }}
        />
      )}
      <Button
        className={styles.button}
        type="submit"
        appearance="primary"
        disabledFocusable={entering.isPending}
        icon={entering.isPending ? <Spinner size="tiny" /> : null}
      >
        Sign in
      </Button>
    </form>
  );
}
