/** The people of the invented demo shop; shown on the sign-in page in demo mode, never seeded in production. */
export const demoShop = { shopName: 'Fennmark Boxworks', units: 'in' as const };

export const demoOwner = { name: 'Maren Tolland', email: 'maren@fennmark.example', password: 'chalk-line-and-plumb', role: 'owner' as const };
export const demoMembers = [
  { name: 'Idris Vane', email: 'idris@fennmark.example', password: 'long-point-short-point', role: 'maker' as const },
  { name: 'Juno Pell', email: 'juno@fennmark.example', password: 'two-screws-in-a-stud', role: 'hanger' as const },
];
export const demoAccounts = [demoOwner, ...demoMembers];
