namespace Redshift.Pipeline.Load.Roles;

/// <summary>The role of an array and how far it is from the plain form of it.</summary>
/// <param name="Role">The role.</param>
/// <param name="Rank">0 for the plain form; larger for a variant.</param>
/// <param name="Why">What the role was recognised by.</param>
internal readonly record struct RoleGuess(Role Role, int Rank, string Why);
