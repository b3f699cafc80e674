import * as contracts from "@beadroll/domain/contract/people.contract";
import { changeContext, type Deps } from "../deps.ts";
import { type Route, route } from "../http/route.ts";
import { addQualification, createPerson, listPeople, readPersonPage } from "./people.service.ts";

/** People and their qualifications. */
export function peopleRoutes(deps: Deps): Route[] {
  const { reader } = deps.db;
  return [
    route(contracts.listPeople, ({ query }) => listPeople(reader, query)),
    route(contracts.createPerson, (input) => createPerson(changeContext(deps, input), input.body)),
    route(contracts.getPerson, ({ params }) => readPersonPage(reader, params.tag)),
    route(contracts.addQualification, (input) =>
      addQualification(changeContext(deps, input), input.params.tag, input.body),
    ),
  ];
}
