#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

#include "rain/csv_header_cells.hpp"
#include "rain/csv_text.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"

// The header row of a hyetograph CSV: which columns hold what, in which units.
namespace rainledger {

/// Advice where a log of tips gives elapsed times.
inline constexpr std::string_view kTipsNeedStamps =
    "a tip log needs the instant of every tip, such as 2031-06-14T13:45:07Z";

struct CsvColumns {
    std::size_t line = 1;
    std::size_t count = 0;
    char separator = ',';

    std::optional<CsvColumn> start;
    std::optional<CsvColumn> end;
    bool stamped = false;   ///< timestamps instead of elapsed times
    std::string time_unit;  ///< of elapsed times
    Unit to_h;

    bool of_tips = false;  ///< a log of tips: `rain` holds counts, `start` the instants
    bool has_rain = true;  ///< false: no column of it is there or wanted
    CsvColumn rain;
    RainKind kind = RainKind::depth;
    std::string rain_unit;
    Unit to_mm;  ///< to mm, or to mm/h for intensities

    [[nodiscard]] const CsvColumn& first_time() const { return start ? *start : *end; }
};

/// Understands the header row; nothing after an error.
[[nodiscard]] std::optional<CsvColumns> read_csv_header(const CsvLine& line,
                                                        const CsvLayout& layout,
                                                        CsvProblems& problems);

}  // namespace rainledger
