import Database from "better-sqlite3";

export const STRANGER = "stranger@elsewhere.example";

/** A second team with one engineer in it, straight into the database: there is no screen yet that founds a team. The password is the demo's. */
export function addOtherTeam(databaseFile: string): void {
  const db = new Database(databaseFile);
  const [team, user] = ["01945a00-0001-7000-8000-0000000000ff", "01945a00-0002-7000-8000-0000000000ff"];
  const at = new Date().toISOString();
  db.prepare("insert into teams (id, name, created_at) values (?, 'Elsewhere', ?)").run(team, at);
  db.prepare(
    "insert into users (id, email, name, password_hash, created_at) select ?, ?, 'A. Stranger', password_hash, ? from users limit 1",
  ).run(user, STRANGER, at);
  db.prepare("insert into memberships (team_id, user_id, residual_risk) values (?, ?, 'Medium')").run(team, user);
  for (const role of ["engineer", "reviewer", "pilot"])
    db.prepare("insert into member_roles (team_id, user_id, role) values (?, ?, ?)").run(team, user, role);
  db.close();
}
