import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { findAddresses, findNearestAddress, getRoadLines } from '#shared/api/addresses.ts';
import { callApi } from './callApi.ts';

export const addressQueries = {
  find: (text: string) =>
    queryOptions({
      queryKey: ['addresses', text],
      queryFn: ({ signal }) => callApi(findAddresses, { query: { text }, signal }),
      enabled: text.trim().length > 1,
      placeholderData: keepPreviousData,
      staleTime: 5 * 60_000,
    }),
  /** Road shapes through points in order; cached by the points themselves. */
  roadLines: (points: [number, number][]) =>
    queryOptions({
      queryKey: ['road-lines', points],
      queryFn: ({ signal }) => callApi(getRoadLines, { body: { points }, signal }),
      enabled: points.length > 1,
      staleTime: Infinity,
    }),
};

/** The address next to a pin a person dropped. */
export const readNearestAddress = (lat: number, lon: number) =>
  callApi(findNearestAddress, { query: { lat, lon } });

/** Addresses for what a person is typing, asked after a short pause. */
export function useAddressSearch(text: string) {
  const [asked, setAsked] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(text), 180);
    return () => clearTimeout(timer);
  }, [text]);
  const found = useQuery(addressQueries.find(asked.trim()));
  return {
    addresses: asked.trim().length > 1 ? (found.data ?? []) : [],
    searching: found.isFetching || asked !== text,
    failed: found.isError,
  };
}
