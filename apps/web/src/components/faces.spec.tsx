import { render, screen } from '@testing-library/react';
import type { UseQueryResult } from '@tanstack/react-query';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { ApiError } from '../lib/http.js';
import { Answer } from './faces.js';

const refused = (status: number, code: 'NOT_FOUND' | 'FORBIDDEN') => {
  const query = { data: undefined, error: new ApiError(status, code, 'There is no such job.', 'r-1') } as unknown as UseQueryResult<string>;
  render(
    <MemoryRouter>
      <Answer query={query}>{(words) => <p>{words}</p>}</Answer>
    </MemoryRouter>,
  );
};

describe('the page of a thing that is not there', () => {
  it('says so as its heading and leads back, and offers no second try that cannot help', () => {
    refused(404, 'NOT_FOUND');
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('There is nothing at this address');
    expect(screen.getByRole('link', { name: 'To the start' }).getAttribute('href')).toBe('/');
    expect(screen.queryByRole('button', { name: 'Try again' })).toBeNull();
  });

  it('says why something that is there was refused', () => {
    refused(403, 'FORBIDDEN');
    expect(screen.getByRole('alert').textContent).toContain('There is no such job.');
  });
});
