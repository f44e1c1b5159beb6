import { createContext, use, useCallback, useMemo, useRef, useState, type ReactNode } from 'react';
import { Button } from './button.tsx';

interface Toast {
  id: number;
  message: string;
}

const ToastContext = createContext<((message: string) => void) | null>(null);

const shownForMs = 8000;

/** Says shortly that something was done; errors are shown where they arose, never here. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [toasts, setToasts] = useState<readonly Toast[]>([]);
  const nextId = useRef(0);
  const dismiss = useCallback((id: number) => {
    setToasts((before) => before.filter((toast) => toast.id !== id));
  }, []);
  const show = useCallback(
    (message: string) => {
      const id = nextId.current++;
      setToasts((before) => [...before.slice(-2), { id, message }]);
      window.setTimeout(() => dismiss(id), shownForMs);
    },
    [dismiss],
  );
  const region = useMemo(
    () => (
      <div
        role="status"
        className="no-print pointer-events-none fixed inset-x-0 bottom-0 z-30 flex flex-col items-center gap-2 p-4"
      >
        {toasts.map((toast) => (
          <div
            key={toast.id}
            className="pointer-events-auto flex max-w-xl items-baseline gap-4 border border-ink bg-ink px-4 py-2.5 text-paper"
          >
            <span>{toast.message}</span>
            <Button kind="plain" onPress={() => dismiss(toast.id)}>
              Close
            </Button>
          </div>
        ))}
      </div>
    ),
    [dismiss, toasts],
  );
  return (
    <ToastContext value={show}>
      {children}
      {region}
    </ToastContext>
  );
}

export function useToast(): (message: string) => void {
  const show = use(ToastContext);
  if (show === null) throw new Error('useToast is used outside the toast provider');
  return show;
}
