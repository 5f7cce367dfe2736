import { redirect } from "next/navigation";
import { homeOf } from "./_server/menu";
import { pageActor } from "./_server/session";

/** The front door: to the day's work, or to the sign-in page. */
export default async function FrontDoor() {
  redirect(homeOf(await pageActor()));
}
