import { useQuery } from "@tanstack/react-query";
import type { CompanyChange, CompanyDetail, CompanyPerson, PersonChange } from "@/lib/api";
import { request } from "./api";
import { keys } from "./queries";

const at = encodeURIComponent;
const place = (companyId: string) => `/api/companies/${at(companyId)}`;

/** Calls about a company's settings and people. */
export const companyApi = {
  get: (companyId: string) => request<CompanyDetail>("GET", place(companyId)),
  change: (companyId: string, change: CompanyChange) => request<CompanyDetail>("PATCH", place(companyId), change),
  people: (companyId: string) => request<{ people: CompanyPerson[] }>("GET", `${place(companyId)}/people`),
  changePerson: (companyId: string, id: string, change: PersonChange) => request<CompanyPerson>("PATCH", `${place(companyId)}/people/${at(id)}`, change),
};

export const companyKey = (companyId: string) => ["company", companyId] as const;
export const useCompany = (companyId: string) => useQuery({ queryKey: companyKey(companyId), queryFn: () => companyApi.get(companyId) });
export const useCompanyPeople = (companyId: string) => useQuery({ queryKey: keys.people(companyId), queryFn: () => companyApi.people(companyId) });
