#include <utility>

#include "cli/storm_sources.hpp"

// The list of a record's events.
namespace rainledger {

bool read_statistics(OpenedRecord& read, std::string_view named_by, Diagnostics& diagnostics,
                     std::string& problem) {
    const std::optional<std::string>& path = read.source.statistics_path;
    if (!path) return true;
    auto text = read_file(*path, diagnostics);
    if (!text) return false;
    read.statistics = read_rainfall_statistics_csv(*path, *std::move(text), diagnostics);
    if (!read.statistics) return false;
    if (!read.statistics->return_period_yr.empty()) return true;
    problem = std::string(named_by) + ": '" + *path +
              "' names no return periods, so it cannot say how rare an event was";
    return false;
}

Gathered list_events(std::string title, OpenedRecord read, std::string read_as) {
    const RecordSource& source = read.source;
    RecordEvents events = find_events(read.record, source.rule, source.steps);
    std::vector<EventRarity> rarities;
    if (read.statistics)
        for (const RainEvent& event : events.events)
            rarities.push_back(rarity_of(event_rain(read.record, event, source.rule, source.steps),
                                         *read.statistics));
    ShownEvents shown{std::move(title), std::move(read.record), source.rule, std::move(events),
                      std::move(rarities)};
    return {StormFindings{std::move(read_as), std::move(shown)}, {}};
}

}  // namespace rainledger
