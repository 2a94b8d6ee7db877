import { useEffect, useState } from 'react';
import { addRunFix } from '#shared/api/runs.ts';
import { callApi } from '#src/api/callApi.ts';
import { clockOffsetMs } from '#src/offline/clockOffset.ts';

export type PlaceSharing = 'unknown' | 'mayAsk' | 'on' | 'refused' | 'none';

const everyMs = 15_000;

/**
 * While `driving` and the page is in front, posts the phone's place at most every 15 s. Never asks
 * by itself: `allow` does, after a touch. A place is worth nothing once old, so nothing is queued.
 */
export function usePositionFixes(runId: string, driving: boolean) {
  const [sharing, setSharing] = useState<PlaceSharing>(firstSharing);
  useEffect(() => {
    let status: PermissionStatus | null = null;
    const read = () => setSharing(sharingOf(status));
    if (navigator.geolocation && navigator.permissions)
      navigator.permissions.query({ name: 'geolocation' }).then(
        (answer) => {
          status = answer;
          answer.addEventListener('change', read);
          read();
        },
        () => setSharing('mayAsk'),
      );
    return () => status?.removeEventListener('change', read);
  }, []);

  useEffect(() => {
    if (!driving || sharing !== 'on') return;
    let sentAtMs = 0;
    const watch = navigator.geolocation.watchPosition(
      ({ coords, timestamp }) => {
        const now = Date.now();
        if (document.visibilityState === 'hidden' || now - sentAtMs < everyMs) return;
        if (now - timestamp > 60_000) return;
        sentAtMs = now;
        const body = {
          lat: coords.latitude,
          lon: coords.longitude,
          at: new Date(timestamp + clockOffsetMs()).toISOString(),
          accuracyMetres: Math.min(100_000, Math.round(coords.accuracy)),
        };
        // A lost fix needs no second try: the next one is better.
        callApi(addRunFix, { params: { runId }, body }).catch(() => undefined);
      },
      (error) => {
        if (error.code === error.PERMISSION_DENIED) setSharing('refused');
      },
      { enableHighAccuracy: true, maximumAge: 10_000 },
    );
    return () => navigator.geolocation.clearWatch(watch);
  }, [driving, sharing, runId]);

  const allow = () =>
    navigator.geolocation.getCurrentPosition(
      () => setSharing('on'),
      (error) => setSharing(error.code === error.PERMISSION_DENIED ? 'refused' : 'on'),
      { maximumAge: 60_000, timeout: 10_000 },
    );
  return { sharing, allow };
}

function firstSharing(): PlaceSharing {
  if (!navigator.geolocation) return 'none';
  return navigator.permissions ? 'unknown' : 'mayAsk';
}

function sharingOf(status: PermissionStatus | null): PlaceSharing {
  if (status?.state === 'granted') return 'on';
  return status?.state === 'denied' ? 'refused' : 'mayAsk';
}
