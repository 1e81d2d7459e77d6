import { OpeningSheet } from "@/components/diagram/chrome/openingSheet";

export default function Loading() {
  return <OpeningSheet />;
}
