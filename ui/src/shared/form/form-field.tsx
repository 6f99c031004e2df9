import { Field, type FieldProps } from '@fluentui/react-components';
import type { ApiProblem } from '../api/api-problem';

type Props = Omit<FieldProps, 'validationMessage' | 'validationState'> & {
  /** Name of the field in what is sent: `email`, `window.youngKa`. */
  name: string;
  problem?: ApiProblem | null;
  /** A fault found before sending. */
  fault?: string;
};

/** A labelled field that shows what the service said about it, directly beneath. */
export function FormField({ name, problem, fault, className, ...field }: Props) {
  const message = fault ?? problem?.at(name);
  return (
    <Field
      {...field}
      className={className ? `sl-field ${className}` : 'sl-field'}
      validationState={message ? 'error' : 'none'}
      validationMessage={message}
    />
  );
}
