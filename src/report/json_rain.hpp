#pragma once

#include <span>
#include <string>
#include <string_view>

#include "rainledger/scenario/scenario.hpp"
#include "report/json_writer.hpp"

// What the JSON of every command shares: its frame, and the rain of a storm.
namespace rainledger {

/// Opens the object with its title (null where it is empty) and the program.
void begin_results(JsonWriter& json, const std::string& title);
/// Closes it with warnings and caution.
void end_results(JsonWriter& json, std::span<const std::string> warnings, std::string_view caution);

/// A text, or null where it is empty.
void text_or_null(JsonWriter& json, std::string_view key, std::string_view text);

/// The rain of a storm as one object: its totals and, where they apply, how it came about under
/// `design`, `event` and `resampled`.
void write_rain(JsonWriter& json, const Storm& storm);

/// Members of an event: its depth, {"5": MM, "10": MM, ...} of its peaks, the rain before it, and
/// depths and return periods by duration with the rarest; `rarity` may be null.
void write_event_figures(JsonWriter& json, const RainEvent& event, const EventRarity* rarity);

}  // namespace rainledger
