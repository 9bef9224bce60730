import { FluentProvider } from '@fluentui/react-components';
import { useEffect, type ReactNode } from 'react';
import { readThemeChoice, useThemeMode } from './mode.js';
import { darkTheme, lightTheme } from './themes.js';

/** Fluent in our theme, following the system or the reader's stored choice. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const mode = useThemeMode();
  useEffect(() => {
    const choice = readThemeChoice();
    if (choice === 'system') delete document.documentElement.dataset['theme'];
    else document.documentElement.dataset['theme'] = choice;
    document.documentElement.style.colorScheme = mode;
  }, [mode]);
  return (
    <FluentProvider theme={mode === 'dark' ? darkTheme : lightTheme} style={{ background: 'transparent' }}>
      {children}
    </FluentProvider>
  );
}
