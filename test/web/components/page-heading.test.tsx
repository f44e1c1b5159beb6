import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { Link, MemoryRouter, Route, Routes } from 'react-router-dom';
import { afterEach, describe, expect, it } from 'vitest';
import { PageHeading } from '../../../web/components/page-heading.tsx';

afterEach(cleanup);

describe('a page’s heading', () => {
  it('names the tab, and takes the focus after a navigation but not at the first page', () => {
    render(
      <MemoryRouter>
        <Link to="/method">to the method</Link>
        <Routes>
          <Route path="/" element={<PageHeading>Open cases</PageHeading>} />
          <Route path="/method" element={<PageHeading>Method</PageHeading>} />
        </Routes>
      </MemoryRouter>,
    );
    expect(document.title).toBe('Open cases · Noonmark');
    expect(document.activeElement).toBe(document.body);

    fireEvent.click(screen.getByText('to the method'));
    expect(document.title).toBe('Method · Noonmark');
    expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Method' }));
  });
});
