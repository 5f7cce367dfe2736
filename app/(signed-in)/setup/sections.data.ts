import type { Permission } from "@/modules/access";
import { auditMay } from "@/modules/audit";
import { identityMay } from "@/modules/identity";
import { measurementsMay } from "@/modules/measurements";
import { methodsMay } from "@/modules/methods";
import { notificationsMay } from "@/modules/notifications";
import { systemsMay } from "@/modules/systems";

export type SetupSection = {
  href: string;
  label: string;
  /** One sentence: what is set up there. */
  says: string;
  /** One of these is needed. */
  for: readonly Permission[];
};

export type SetupGroup = { title: string; sections: readonly SetupSection[] };

/** What can be set up, grouped as a person looks for it. A section stands here once its page works. */
export const SETUP: readonly SetupGroup[] = [
  {
    title: "People",
    sections: [
      {
        href: "/setup/people",
        label: "People",
        says: "Invite people, give and end roles, say in which areas somebody works, shut somebody out.",
        for: [identityMay.readPeople],
      },
      {
        href: "/setup/deputies",
        label: "Deputies",
        says: "Who stands in for whom, in which role, from which day to which.",
        for: [identityMay.nameDeputies, identityMay.readPeople],
      },
      {
        href: "/setup/roles",
        label: "Roles",
        says: "The table of what each role may do, as the server decides it.",
        for: [identityMay.listPeople],
      },
    ],
  },
  {
    title: "The facility",
    sections: [
      {
        href: "/setup/areas",
        label: "Areas",
        says: "Galleries and buildings, their biosecurity level and the order in which they are walked.",
        for: [systemsMay.read],
      },
      {
        href: "/setup/systems",
        label: "Systems",
        says: "Bodies of water with their points, their equipment and how much they hold.",
        for: [systemsMay.read],
      },
    ],
  },
  {
    title: "What is measured",
    sections: [
      {
        href: "/setup/watch",
        label: "What is read where",
        says: "The parameters that are read at each point, in which order, how often, and with what.",
        for: [measurementsMay.read],
      },
      {
        href: "/setup/limits",
        label: "Limits",
        says: "What each reading is judged by: in force, proposed, and every version before.",
        for: [measurementsMay.read],
      },
      {
        href: "/setup/parameters",
        label: "Parameters",
        says: "What is measured or checked: units, decimals, plausible bounds, answers and what they mean.",
        for: [methodsMay.read],
      },
      {
        href: "/setup/methods",
        label: "Methods",
        says: "The written procedures by which parameters are measured.",
        for: [methodsMay.read],
      },
      {
        href: "/setup/instruments",
        label: "Instruments",
        says: "Devices by their serial number, their checks as found and as left, and when the next is due.",
        for: [methodsMay.read],
      },
    ],
  },
  {
    title: "This installation",
    sections: [
      {
        href: "/setup/health",
        label: "Health and backup",
        says: "Room on the disk, backups, work that failed, and the settings in force.",
        for: [auditMay.readHealth],
      },
      {
        href: "/setup/outbox",
        label: "Mail",
        says: "The letters that went out, that wait, and that could not be sent.",
        for: [notificationsMay.readOutbox],
      },
    ],
  },
];
