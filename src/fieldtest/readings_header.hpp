#pragma once

#include <cstddef>
#include <functional>
#include <optional>
#include <string>

#include "fieldtest/plain_rows.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/fieldtest/readings.hpp"

// The header row of a CSV of readings.
namespace rainledger {

struct ReadingColumns {
    std::size_t count = 0;
    std::size_t time = 0;  ///< index among the cells
    std::size_t value = 0;
    std::optional<std::size_t> pit = {};
    std::optional<std::size_t> refill = {};
    ReadingKind kind = ReadingKind::infiltrated;
    std::string time_unit;
    std::string value_unit;
    Unit to_h;
    Unit to_canonical;  ///< mm, or m3 for volumes
};

/// Takes an error: byte column, message, hint.
using ReportCell = std::function<void(std::size_t, std::string, std::string)>;

/// Understands the header row; nothing after an error.
[[nodiscard]] std::optional<ReadingColumns> read_readings_header(const PlainLine& line,
                                                                 const ReportCell& report);

}  // namespace rainledger
