#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>

// "Did you mean": the nearest known name to one that was typed.
namespace rainledger {

/// The known name nearest to `typed` by edit distance (insertions, deletions, substitutions and
/// swaps of neighbours each count one; case, and '-' or ' ' for '_', count nothing), if it is near
/// enough to be a likely slip: at most 3 edits and less than half of the longer name.
[[nodiscard]] std::optional<std::string_view> nearest(std::string_view typed,
                                                      std::span<const std::string_view> known);

/// "did you mean 'x'?" for the nearest known name, else "known here: a, b, c".
[[nodiscard]] std::string suggestion(std::string_view typed,
                                     std::span<const std::string_view> known);

}  // namespace rainledger
