// @vitest-environment happy-dom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MapContainer } from 'react-leaflet';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { PinPicker } from './PinPicker.tsx';
import { StopMarker } from './StopMarker.tsx';
import { VanMarker } from './VanMarker.tsx';

afterEach(cleanup);

function renderOnMap(children: React.ReactNode) {
  return render(
    <MapContainer center={[41, -36]} zoom={14}>
      {children}
    </MapContainer>,
  );
}

const stop = { number: 3, shape: 'square', colour: 'var(--collar)', lat: 41, lon: -36 };

describe('StopMarker', () => {
  it('is a named button that keyboard and mouse choose', async () => {
    const onSelect = vi.fn();
    renderOnMap(<StopMarker {...stop} label="Stop 3 of Otter, Juniper" onSelect={onSelect} />);
    const mark = screen.getByRole('button', { name: 'Stop 3 of Otter, Juniper' });
    expect(mark.getAttribute('aria-pressed')).toBe('false');
    mark.focus();
    await userEvent.keyboard('{Enter}');
    await userEvent.keyboard(' ');
    expect(onSelect).toHaveBeenCalledTimes(2);
    expect(mark.textContent).toBe('3');
  });

  it('keeps its element, and so the focus, when it is chosen', () => {
    const marker = (selected: boolean) => (
      <MapContainer center={[41, -36]} zoom={14}>
        <StopMarker {...stop} label="Stop 3" selected={selected} onSelect={() => {}} />
      </MapContainer>
    );
    const { rerender } = render(marker(false));
    const before = screen.getByRole('button', { name: 'Stop 3' });
    rerender(marker(true));
    const after = screen.getByRole('button', { name: 'Stop 3' });
    expect(after).toBe(before);
    expect(after.getAttribute('aria-pressed')).toBe('true');
  });
});

describe('VanMarker', () => {
  it('is a picture, not a button, when nothing happens on choosing it', () => {
    renderOnMap(<VanMarker {...stop} label="Otter, expected here" expected />);
    expect(screen.getByRole('img', { name: 'Otter, expected here' }).tabIndex).toBe(-1);
  });
});

describe('PinPicker', () => {
  it('moves by arrow keys: north is up, east is right', async () => {
    const onChange = vi.fn<(value: { lat: number; lon: number }) => void>();
    renderOnMap(<PinPicker value={{ lat: 41, lon: -36 }} onChange={onChange} label="Front door" />);
    screen.getByRole('button', { name: /Front door/ }).focus();
    await userEvent.keyboard('{ArrowUp}');
    await userEvent.keyboard('{ArrowRight}');
    const [up, right] = onChange.mock.calls.map(([moved]) => moved);
    expect(up!.lat).toBeGreaterThan(41);
    // Zoom 14 at 41° N: 7.2 m a pixel, so 12 pixels are 86 m or 0.00078°.
    expect(up!.lat - 41).toBeCloseTo(0.00078, 4);
    expect(right!.lon).toBeGreaterThan(-36);
  });

  it('offers a button where there is no pin yet', async () => {
    const onChange = vi.fn<(value: { lat: number; lon: number }) => void>();
    renderOnMap(<PinPicker value={null} onChange={onChange} />);
    await userEvent.click(screen.getByRole('button', { name: 'Put the pin in the middle' }));
    expect(onChange).toHaveBeenCalledTimes(1);
    expect(onChange.mock.calls[0]![0].lat).toBeCloseTo(41, 3);
  });
});
