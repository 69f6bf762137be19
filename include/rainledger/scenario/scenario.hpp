#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/ledger/surface.hpp"
#include "rainledger/rain/design_storm.hpp"
#include "rainledger/rain/hyetograph.hpp"
#include "rainledger/rain/rain_events.hpp"

// A scenario: a site and the storms that fall on it, read from YAML.
namespace rainledger {

/// A storm made from `design:`. Figures are those of the design, before multiply_by.
struct DesignOrigin {
    StormPattern pattern = StormPattern::alternating_blocks;
    double duration_h = 0.0;
    double every_h = 0.0;
    std::optional<double> peak_at;  ///< where the pattern has one
    bool peak_at_assumed = false;   ///< not given: the default
    std::optional<double> return_period_yr;
    std::string depth_words;  ///< where the depth is from: "county_rain.csv", "the formula", ...
    std::string
        curve_words;  ///< of a mass curve: its title and source, or "points in the scenario"
    std::vector<HeldStatistic> held;  ///< as in DesignStorm
};

/// A gauge record as a scenario names and describes it.
struct RecordSource {
    std::string path;  ///< as opened
    RecordLayout layout;
    EventRule rule;
    EventSteps steps;
    std::optional<std::string> statistics_path;  ///< for the rarity of its events
};

/// A storm cut out of a gauge record. Figures are the record's, before multiply_by and resample.
struct EventOrigin {
    RecordSource source;
    RainEvent event;                    ///< number 0 for rain between two given instants
    std::size_t events_in_record = 0;   ///< 0 likewise
    std::optional<EventRarity> rarity;  ///< where statistics were named
};

/// A storm brought to another step.
struct ResampledFrom {
    double every_h = 0.0;
    double peak_before_mm_per_h = 0.0;  ///< both before multiply_by
    double peak_after_mm_per_h = 0.0;
};

/// One storm of a scenario.
struct Storm {
    std::string name;  ///< "storm" when given under `storm:`; an event out of a record named in one
                       ///< line is called by its start, "2031-06-14 13:45"
    Hyetograph rain;   ///< with resample, multiply_by and continue_for applied
    double multiply_by = 1.0;
    double continued_h = 0.0;
    std::variant<std::monostate, DesignOrigin, EventOrigin> origin;  ///< none: rain as given
    std::optional<ResampledFrom> resampled;
    Place place;       ///< of its name, for messages that only the march can give
    std::string file;  ///< the rain's file (hyetograph, statistics or record) as the scenario names
                       ///< it; empty where there is none
    std::vector<std::string> files;  ///< every file that it was read from, as opened
};

/// Where a surface stands in the scenario's text, for messages that only the march can give.
struct SurfacePlaces {
    Place surface;          ///< its name
    Place observed_excess;  ///< of a phi index; line 0 elsewhere
};

struct Scenario {
    std::string title;
    std::vector<Storm> storms;          ///< at least one
    Site site;                          ///< without surfaces where none were needed and given
    std::vector<SurfacePlaces> places;  ///< one per surface
};

/// Whether a scenario needs surfaces. Where it does not, those that stand there are read and
/// checked all the same.
enum class Surfaces { needed, not_needed };

/// Reads a scenario from a file; paths in it are relative to the file. Every problem found is added
/// to `diagnostics`; nothing is returned if any is an error.
[[nodiscard]] std::optional<Scenario> read_scenario(const std::string& path,
                                                    Diagnostics& diagnostics,
                                                    Surfaces surfaces = Surfaces::needed);

/// The same from text that is already in memory; `name` stands for the file in messages and gives
/// the folder for relative paths.
[[nodiscard]] std::optional<Scenario> read_scenario_text(const std::string& name, std::string text,
                                                         Diagnostics& diagnostics,
                                                         Surfaces surfaces = Surfaces::needed);

/// The JSON Schema (draft 2020-12) of the scenario YAML, as text ending in a newline.
[[nodiscard]] std::string scenario_schema();

}  // namespace rainledger
