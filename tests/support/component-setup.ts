import '@testing-library/jest-dom/vitest';
import { cleanup } from '@testing-library/react';
import { afterEach } from 'vitest';

// jsdom lays nothing out, so nothing lies under a pointer.
document.elementFromPoint ??= () => null;

afterEach(cleanup);
