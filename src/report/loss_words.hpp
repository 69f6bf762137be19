#pragma once

#include <string>

#include "rainledger/ledger/surface.hpp"
#include "report/display.hpp"

// Ways to lose rain, in words.
namespace rainledger {

/// Short, for a table: "Green-Ampt", "curve number 89".
[[nodiscard]] std::string method_words(const Losses& losses);

/// The method with its parameters: "Horton following infiltrated depth, initial capacity 50 mm/h,
/// ...". The rate matched for a phi index depends on the storm and is not part of it.
[[nodiscard]] std::string assumption_words(const Losses& losses, const Display& display);

/// True for a surface whose ponding people speak of: neither impervious nor a curve number.
[[nodiscard]] bool can_pond(const Losses& losses);

}  // namespace rainledger
