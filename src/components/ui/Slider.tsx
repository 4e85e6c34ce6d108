import { Label } from 'react-aria-components/Label';
import { Slider as AriaSlider, SliderOutput, SliderThumb, SliderTrack } from 'react-aria-components/Slider';
import { classes } from './classes';

export interface SliderProps {
  label: string;
  value: number;
  onChange: (value: number) => void;
  onChangeEnd?: (value: number) => void;
  min?: number;
  max?: number;
  step?: number;
  /** What is said and shown for a value, such as "60 %". */
  format?: (value: number) => string;
  hideLabel?: boolean;
  isDisabled?: boolean;
  className?: string;
}

export function Slider(props: SliderProps) {
  const { label, value, onChange, onChangeEnd, min = 0, max = 100, step = 1, format, hideLabel, isDisabled, className } = props;
  const end = onChangeEnd && ((next: number | number[]) => onChangeEnd(Array.isArray(next) ? (next[0] ?? value) : next));
  return (
    <AriaSlider
      value={value}
      onChange={(next) => onChange(Array.isArray(next) ? (next[0] ?? value) : next)}
      onChangeEnd={end}
      minValue={min}
      maxValue={max}
      step={step}
      isDisabled={isDisabled}
      className={classes('slider', className)}
    >
      <Label className={hideLabel ? 'sr-only' : 'label'}>{label}</Label>
      <SliderOutput className="muted">{format?.(value) ?? undefined}</SliderOutput>
      <SliderTrack className="slider-track">
        <SliderThumb className="slider-thumb" aria-valuetext={format?.(value)} />
      </SliderTrack>
    </AriaSlider>
  );
}
