/** Where the browser keeps which team was open last. */
export const lastTeamKey = 'tapeline.team';
