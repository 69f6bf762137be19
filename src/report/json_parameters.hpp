#pragma once

#include <optional>
#include <string_view>

#include "rainledger/ledger/surface.hpp"
#include "report/json_writer.hpp"

namespace rainledger {

/// The JSON name of a way to lose rain: "green_ampt".
[[nodiscard]] std::string_view method_key(const Losses& losses);

/// The parameters as one JSON object, keys named like the scenario's with their canonical unit.
/// `matched` is the rate found for a phi index.
void write_parameters(JsonWriter& json, const Losses& losses, std::optional<double> matched);

}  // namespace rainledger
