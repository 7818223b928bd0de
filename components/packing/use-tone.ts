'use client';

import { useCallback, useRef, useSyncExternalStore } from 'react';

/** One tone is right, two low ones are wrong. Hertz and seconds. */
const tones = {
  right: [{ pitch: 880, at: 0, long: 0.12 }],
  wrong: [
    { pitch: 220, at: 0, long: 0.18 },
    { pitch: 196, at: 0.26, long: 0.24 },
  ],
} as const;

const key = 'coilyard-packing-sound';
const changed = 'coilyard-sound-changed';

function subscribe(listener: () => void) {
  window.addEventListener(changed, listener);
  return () => window.removeEventListener(changed, listener);
}

const isOnNow = () => window.localStorage.getItem(key) !== 'off';

/** The packer's tones, and the switch that this tablet remembers. */
export function useTone() {
  const context = useRef<AudioContext | null>(null);
  const isOn = useSyncExternalStore(subscribe, isOnNow, () => true);

  const sound = useCallback((kind: keyof typeof tones) => {
    if (!isOnNow() || typeof AudioContext === 'undefined') return;
    context.current ??= new AudioContext();
    const audio = context.current;
    for (const { pitch, at, long } of tones[kind]) {
      const [wave, volume] = [audio.createOscillator(), audio.createGain()];
      const start = audio.currentTime + at;
      wave.frequency.value = pitch;
      volume.gain.setValueAtTime(0.25, start);
      volume.gain.exponentialRampToValueAtTime(0.001, start + long);
      wave.connect(volume).connect(audio.destination);
      wave.start(start);
      wave.stop(start + long);
    }
  }, []);

  const toggle = useCallback(() => {
    window.localStorage.setItem(key, isOnNow() ? 'off' : 'on');
    window.dispatchEvent(new Event(changed));
  }, []);

  return { isOn, toggle, sound };
}
