#pragma once

#include <array>
#include <optional>
#include <span>
#include <string>
#include <string_view>

// The words of the YAML of scenarios and field tests: the closed list of keys of every map, and the
// trade's other words for them. The reader and the JSON Schema both follow these lists.
namespace rainledger {

using Words = std::span<const std::string_view>;

inline constexpr auto kScenarioKeys =
    std::to_array<std::string_view>({"title", "storm", "storms", "surfaces"});

inline constexpr auto kStormKeys = std::to_array<std::string_view>(
    {"hyetograph", "steps", "design", "record", "resample", "multiply_by", "continue_for"});
/// The forms of a storm's rain, of which it has one.
inline constexpr auto kRainForms =
    std::to_array<std::string_view>({"hyetograph", "steps", "design", "record"});
inline constexpr auto kHyetographKeys =
    std::to_array<std::string_view>({"file", "time", "rain", "unit", "time_unit", "kind", "stamp",
                                     "every", "zone", "gaps", "missing"});
inline constexpr auto kStepsKeys =
    std::to_array<std::string_view>({"every", "ends", "depths", "intensities", "unit"});
inline constexpr auto kRainKinds =
    std::to_array<std::string_view>({"depth", "intensity", "cumulative"});
inline constexpr auto kStamps = std::to_array<std::string_view>({"start", "end"});
inline constexpr auto kGaps = std::to_array<std::string_view>({"dry"});

inline constexpr auto kDesignKeys = std::to_array<std::string_view>(
    {"pattern", "duration", "every", "peak_at", "curve", "interpolate", "return_period",
     "statistics", "depth", "depths", "formula"});
inline constexpr auto kDepthSources =
    std::to_array<std::string_view>({"statistics", "depth", "depths", "formula"});
inline constexpr auto kPatterns = std::to_array<std::string_view>(
    {"uniform", "triangular", "alternating_blocks", "keifer_chu", "mass_curve"});
inline constexpr auto kInterpolate = std::to_array<std::string_view>({"linear", "smooth"});
inline constexpr auto kFormulaKeys = std::to_array<std::string_view>({"a", "b", "m", "n", "time"});
inline constexpr auto kFormulaTimes = std::to_array<std::string_view>({"s", "min", "h"});

inline constexpr auto kRecordKeys = std::to_array<std::string_view>(
    {"file", "tip", "count", "tips", "every", "dry_spell", "threshold", "event", "statistics",
     "time", "rain", "unit", "time_unit", "kind", "stamp", "zone", "missing"});
inline constexpr auto kFromRecordKeys = std::to_array<std::string_view>(
    {"file", "tip", "count", "tips", "every", "dry_spell", "threshold", "at_least", "statistics",
     "time", "rain", "unit", "time_unit", "kind", "stamp", "zone", "missing"});
inline constexpr std::string_view kFromRecord = "from_record";
inline constexpr auto kCounts = std::to_array<std::string_view>({"per_row", "running"});
inline constexpr auto kTips = std::to_array<std::string_view>({"in_steps", "spread"});
inline constexpr std::string_view kLargest = "largest";
inline constexpr auto kStretchKeys = std::to_array<std::string_view>({"from", "to"});

inline constexpr auto kSurfaceKeys =
    std::to_array<std::string_view>({"area", "drains_to", "interception", "depression_storage",
                                     "ponded_water", "losses", "runs_onto"});
inline constexpr auto kReservedNames =
    std::to_array<std::string_view>({"site", "storm", "storms", "table"});
inline constexpr auto kPondedWater = std::to_array<std::string_view>({"infiltrates", "held"});

inline constexpr std::string_view kImpervious = "impervious";
inline constexpr auto kLaws = std::to_array<std::string_view>(
    {"horton", "green_ampt", "philip", "constant_rate", "phi_index", "curve_number"});
inline constexpr auto kHortonKeys = std::to_array<std::string_view>(
    {"initial_capacity", "final_capacity", "decay", "follows", "recovery"});
inline constexpr auto kFollows =
    std::to_array<std::string_view>({"infiltrated_depth", "elapsed_time"});
inline constexpr auto kGreenAmptKeys = std::to_array<std::string_view>(
    {"effective_conductivity", "wetting_front_suction", "moisture_deficit", "suction_deficit",
     "storage_limit", "barrier_rate"});
inline constexpr auto kPhilipKeys = std::to_array<std::string_view>({"sorptivity", "steady_term"});
inline constexpr auto kConstantRateKeys = std::to_array<std::string_view>({"rate", "initial_loss"});
inline constexpr auto kPhiIndexKeys = std::to_array<std::string_view>({"observed_excess"});
inline constexpr auto kCurveNumberKeys = std::to_array<std::string_view>(
    {"number", "initial_abstraction_ratio", "tabulated_ratio", "antecedent"});
inline constexpr auto kConditions = std::to_array<std::string_view>({"I", "II", "III"});

inline constexpr auto kFieldTestKeys = std::to_array<std::string_view>(
    {"title", "readings", "ring", "laws", "steady_rate", "ignore_first", "design_factor"});
inline constexpr auto kRingKeys =
    std::to_array<std::string_view>({"inner_diameter", "outer_diameter"});
/// What is fitted to a field test; scenarios know the first three.
inline constexpr auto kFittedLaws = std::to_array<std::string_view>(
    {"horton", "green_ampt", "philip", "kostiakov", "modified_kostiakov"});
/// The forms of a steady rate, of which it has one.
inline constexpr auto kSteadyRateKeys = std::to_array<std::string_view>({"use", "fixed", "from"});
inline constexpr std::string_view kFitted = "fitted";
inline constexpr std::string_view kTail = "tail";

/// Whether the word is one of the list.
[[nodiscard]] bool holds(Words words, std::string_view word);

/// The word in `known` for what the trade also calls `typed`; nothing if `typed` is no such word or
/// its counterpart is not known here.
[[nodiscard]] std::optional<std::string_view> synonym(std::string_view typed, Words known);

/// The known word probably meant by an unknown one: its counterpart here or the nearest.
[[nodiscard]] std::optional<std::string_view> probably_meant(std::string_view typed, Words known);

/// What to write instead of an unknown word: its counterpart here, the place that it belongs to,
/// the nearest known word, or all of them.
[[nodiscard]] std::string way_out(std::string_view typed, Words known);

}  // namespace rainledger
