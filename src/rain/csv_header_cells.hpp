#pragma once

#include <array>
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>

#include "rainledger/base/quantity.hpp"

// The cells of a header row, and what to advise where the columns wanted are not among them.
namespace rainledger {

inline constexpr std::array<std::string_view, 3> kTimeNames{"start", "end", "time"};
inline constexpr std::array<std::string_view, 3> kRainNames{"depth", "intensity", "cumulative"};

/// Where a column stands: its index among the cells, and its byte column for messages.
struct CsvColumn {
    std::size_t index = 0;
    std::size_t place = 1;
    std::string title;  ///< the whole header cell
};

/// A header cell taken apart: "End [min]" is called "end" and has the unit "min".
struct HeaderCell {
    CsvColumn column;
    std::string name;  ///< before the square bracket, in lower case
    std::optional<std::string> unit;
};
[[nodiscard]] HeaderCell take_apart(CsvColumn column);

/// Which columns a header lacks.
struct LackingColumns {
    bool time = false;
    bool rain = false;
};

/// "columns here: 'a', 'b'"
[[nodiscard]] std::string column_titles(std::span<const HeaderCell> cells);

/// What to do when no column has one of the `known` names: the likely slip, else the columns there
/// are and an `example` of a name; and how the scenario can name the columns of `file` instead.
[[nodiscard]] std::string column_advice(std::span<const HeaderCell> cells,
                                        std::span<const std::string_view> known,
                                        std::string_view example, const std::string& file,
                                        LackingColumns lacking);

/// "did you mean 'mm'? " for a unit that is known in small letters only, else empty.
[[nodiscard]] std::string unit_guess(std::string_view unit, Dimension dimension);

}  // namespace rainledger
