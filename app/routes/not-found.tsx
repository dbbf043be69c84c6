import { data } from "react-router";

/** Every address that is no page of ours. */
export function loader() {
  throw data("The address is wrong, or what stood here is not yours to see.", { status: 404 });
}

export default function NotFound() {
  return null;
}
