import { Toast, ToastBody, Toaster, ToastTitle, useToastController } from '@fluentui/react-components';
import { useCallback, type ReactNode } from 'react';

const toasterId = 'siltlight-toasts';

export const Toasts = () => <Toaster toasterId={toasterId} position="bottom-end" />;

type Intent = 'success' | 'info' | 'warning' | 'error';

/** Says that something happened, for a few seconds; what needs an answer belongs on the page instead. */
export function useSay() {
  const { dispatchToast } = useToastController(toasterId);
  return useCallback(
    (title: string, detail?: ReactNode, intent: Intent = 'success') =>
      dispatchToast(
        <Toast>
          <ToastTitle>{title}</ToastTitle>
          {detail && <ToastBody>{detail}</ToastBody>}
        </Toast>,
        { intent, timeout: intent === 'error' ? 12_000 : 5_000 },
      ),
    [dispatchToast],
  );
}
