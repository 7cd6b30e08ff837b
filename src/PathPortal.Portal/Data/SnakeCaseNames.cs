using System.Text;
using Microsoft.EntityFrameworkCore;
using Microsoft.EntityFrameworkCore.Metadata;

namespace PathPortal.Portal.Data;

/// <summary>Names columns, keys and indexes the way PostgreSQL is written by hand: lower case with underscores. Tables are named in their mappings.</summary>
internal static class SnakeCaseNames
{
    public static void Apply(IMutableModel model)
    {
        foreach (var entity in model.GetEntityTypes())
        {
            if (entity.IsMappedToJson())
            {
                // What lies inside the column keeps its own names.
                entity.SetContainerColumnName(Of(entity.GetContainerColumnName()!));
                continue;
            }
            if (entity.GetTableName() is not { } table)
                continue;
            foreach (var property in entity.GetProperties())
            {
                // The database's own number of the writing transaction serves as the token of concurrency.
                var isRowVersion = property is { IsConcurrencyToken: true, ValueGenerated: ValueGenerated.OnAddOrUpdate };
                property.SetColumnName(isRowVersion ? "xmin" : Of(property.GetColumnName()));
            }
            foreach (var key in entity.GetKeys())
                key.SetName((key.IsPrimaryKey() ? "pk_" : "ak_") + table);
            foreach (var foreignKey in entity.GetForeignKeys())
                foreignKey.SetConstraintName($"fk_{table}_{Joined(foreignKey.Properties)}");
            foreach (var index in entity.GetIndexes())
                index.SetDatabaseName($"ix_{table}_{Joined(index.Properties)}");
        }
    }

    internal static string Of(string name)
    {
        var text = new StringBuilder(name.Length + 8);
        for (var i = 0; i < name.Length; i++)
        {
            if (char.IsUpper(name[i]) && i > 0 && (!char.IsUpper(name[i - 1]) || (i + 1 < name.Length && char.IsLower(name[i + 1]))))
                text.Append('_');
            text.Append(char.ToLowerInvariant(name[i]));
        }
        return text.ToString();
    }

    private static string Joined(IEnumerable<IMutableProperty> properties) => string.Join('_', properties.Select(p => Of(p.Name)));
}
