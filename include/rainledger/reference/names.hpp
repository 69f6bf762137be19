#pragma once

#include <algorithm>
#include <cstddef>
#include <optional>
#include <span>
#include <string_view>
#include <vector>

// Names of rows, read forgivingly: "sandy-loam", "Sandy Loam" and "sandy_loam" are one name. For a
// near miss there is suggestion() of base/suggest.hpp, given names_of() a table.
namespace rainledger {

/// True if two names agree when case, blanks and punctuation count nothing. Letters, digits and the
/// slash of a fraction count. A name of punctuation alone equals none.
[[nodiscard]] bool same_name(std::string_view a, std::string_view b);

/// True if `name` holds what was typed, under the same rule: "flat roofs" mentions "roof".
[[nodiscard]] bool mentions(std::string_view name, std::string_view typed);

/// The position of the known name that was typed.
[[nodiscard]] std::optional<std::size_t> find_name(std::string_view typed,
                                                   std::span<const std::string_view> known);

/// The rows of that name, in the table's order; a row has a member `name`.
template <typename Row>
[[nodiscard]] std::vector<const Row*> rows_named(std::span<const Row> rows,
                                                 std::string_view typed) {
    std::vector<const Row*> found;
    for (const Row& row : rows)
        if (same_name(row.name, typed)) found.push_back(&row);
    return found;
}

/// The rows whose name mentions what was typed, in the table's order.
template <typename Row>
[[nodiscard]] std::vector<const Row*> rows_mentioning(std::span<const Row> rows,
                                                      std::string_view typed) {
    std::vector<const Row*> found;
    for (const Row& row : rows)
        if (mentions(row.name, typed)) found.push_back(&row);
    return found;
}

/// The names of a table, each once, in the table's order.
template <typename Row>
[[nodiscard]] std::vector<std::string_view> names_of(std::span<const Row> rows) {
    std::vector<std::string_view> names;
    for (const Row& row : rows)
        if (std::find(names.begin(), names.end(), row.name) == names.end())
            names.push_back(row.name);
    return names;
}

}  // namespace rainledger
