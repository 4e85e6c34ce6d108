import { useState } from 'react';
import { Slider } from '@/components/ui/Slider';

const BOTH = 50;
const share = (part: number) => Math.min(1, Math.max(0, part / BOTH));

const words = (value: number): string => {
  if (value === BOTH) return 'both';
  return value < BOTH ? `curves at ${Math.round(100 * share(value))}\u00A0%` : `picture at ${Math.round(100 * share(100 - value))}\u00A0%`;
};

/** Fades a picture and what is drawn over it against each other: the picture alone at one end, the curves alone at the other, both in the middle. */
export function FadeSlider({ picture, chart }: { picture: string; chart: string }) {
  const [value, setValue] = useState(BOTH);
  const fade = (next: number) => {
    setValue(next);
    const style = document.getElementById(picture)?.style;
    style?.setProperty('--picture-shown', String(share(100 - next)));
    style?.setProperty('--curves-shown', String(share(next)));
  };
  return <Slider label={`Picture or curves of ${chart}`} value={value} onChange={fade} step={2} format={words} />;
}
