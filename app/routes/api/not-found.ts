import { notFound } from "@/app/platform/errors";
import { problemJson } from "@/app/http/answers.server";

const answer = ({ request }: { request: Request }) => problemJson(notFound(new URL(request.url).pathname));

export const loader = answer;
export const action = answer;
