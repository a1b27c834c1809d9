import { data } from 'react-router';

/** Addresses that nothing answers. */
export function loader() {
  throw data({ detail: 'There is no page at this address.' }, { status: 404 });
}

export const action = loader;

export default function NotFound() {
  return null;
}
