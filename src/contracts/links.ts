const part = encodeURIComponent;

export function groupHref(groupId: string): string {
  return `/groups/${part(groupId)}`;
}

/** The campaign's first page, its leaderboard. */
export function campaignHref(groupId: string, campaignId: string): string {
  return `${groupHref(groupId)}/campaigns/${part(campaignId)}`;
}

export function heatmapHref(groupId: string, campaignId: string): string {
  return `${campaignHref(groupId, campaignId)}/heatmap`;
}

export function screensHref(groupId: string, campaignId: string): string {
  return `${campaignHref(groupId, campaignId)}/screens`;
}

export function newScreenHref(groupId: string, campaignId: string): string {
  return `${screensHref(groupId, campaignId)}/new`;
}

export function screenHref(groupId: string, campaignId: string, screenId: string): string {
  return `${screensHref(groupId, campaignId)}/${part(screenId)}`;
}

/** A candidate's page; with `wellId`, opened at that well. */
export function candidateHref(
  groupId: string,
  campaignId: string,
  catalystId: string,
  { screenId, wellId }: { screenId?: string; wellId?: string } = {},
): string {
  const search = new URLSearchParams();
  if (screenId) search.set('screen', screenId);
  if (wellId) search.set('well', wellId);
  const query = search.toString();
  const path = `${campaignHref(groupId, campaignId)}/candidates/${part(catalystId)}`;
  return query === '' ? path : `${path}?${query}`;
}
