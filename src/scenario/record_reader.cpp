#include "scenario/record_reader.hpp"

#include <algorithm>
#include <cstddef>
#include <initializer_list>
#include <string_view>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "scenario/csv_layout_reader.hpp"
#include "scenario/input_file.hpp"
#include "scenario/storm_reader.hpp"

namespace rainledger {
namespace {

constexpr double kLongestTipStepH = 24.0;

/// The keys that one kind of record has and the other does not.
void refuse_keys(const ClosedMap& map, std::initializer_list<std::string_view> keys,
                 const std::string& problem, const std::string& hint) {
    for (const std::string_view key : keys)
        if (const Entry* entry = map.find(key))
            map.reading().error(entry->key_mark, "'" + std::string(key) + "' " + problem, hint);
}

/// The length of the steps that tips become, or that each row of interval data covers.
std::optional<double> read_every(const ClosedMap& map) {
    const Entry* entry = map.find("every");
    if (entry == nullptr) return std::nullopt;
    return read_step_length(map.reading(), *entry);
}

RecordSource read_source(const ClosedMap& map) {
    RecordSource source;
    source.layout.csv = read_csv_layout(map);
    source.layout.tip_mm = map.quantity("tip", Dimension::depth, Least::above_zero);
    const auto count = map.word("count", kCounts);
    source.layout.running_count = count && kCounts[*count] == "running";
    const auto tips = map.word("tips", kTips);
    source.steps.spread_tips = tips && kTips[*tips] == "spread";
    const auto every_h = read_every(map);
    if (map.has("tip")) {
        if (every_h && *every_h > kLongestTipStepH)
            map.reading().error(map.mark_of("every"),
                                "every: '" + map.shown("every") + "' is longer than a day",
                                "tips become steps that count from midnight: write some minutes");
        source.steps.every_h = every_h.value_or(source.steps.every_h);
        refuse_keys(map, {"unit", "time_unit", "kind", "stamp"}, "does not go with 'tip'",
                    "each row of a tip log is a tip of that depth at an instant: take it out");
    } else {
        source.layout.csv.every_h = every_h;
        if (!map.is_misnamed("tip"))
            refuse_keys(map, {"count", "tips"}, "goes with a tip log only",
                        "add the depth of one tip, 'tip: 0.2 mm'");
    }
    const EventRule usual;
    source.rule.dry_spell_h =
        map.quantity("dry_spell", Dimension::time, Least::above_zero).value_or(usual.dry_spell_h);
    source.rule.threshold_mm =
        map.quantity("threshold", Dimension::depth).value_or(usual.threshold_mm);
    return source;
}

std::optional<StatisticsFile> read_rarity_table(const ClosedMap& map) {
    const Entry* entry = map.find("statistics");
    if (entry == nullptr) return std::nullopt;
    auto statistics = read_statistics(map.reading(), *entry);
    if (!statistics || !statistics->table.return_period_yr.empty()) return statistics;
    map.reading().error(entry->mark(),
                        in_quotes(statistics->name) +
                            " names no return periods, so it cannot say how rare an event was",
                        "name a table with a column for each return period, or take it out");
    return std::nullopt;
}

/// The header of a tip log that is read as interval data is refused in words that say nothing of
/// tips.
void suggest_tip(const Reading& reading, const Entry& entry, const std::string& path,
                 std::size_t header) {
    const bool refused =
        std::ranges::any_of(reading.diagnostics().list(), [&](const Diagnostic& each) {
            return each.severity == Severity::error && each.place.file == path &&
                   each.place.line == header;
        });
    if (refused)
        reading.warning(entry.mark(), in_quotes(entry.value.Scalar()) + " is read as interval data",
                        "for a log of tips add the depth of one tip, 'tip: 0.2 mm'");
}

}  // namespace

std::optional<ReadRecord> read_record(const ClosedMap& map, std::size_t errors_before) {
    const Reading& reading = map.reading();
    ReadRecord read;
    read.source = read_source(map);
    read.statistics = read_rarity_table(map);
    const Entry* entry = map.require("file", "logger.csv");
    if (entry == nullptr) return std::nullopt;
    auto file = read_input_file(reading, *entry, "file: logger.csv");
    if (!file || reading.diagnostics().error_count() > errors_before) return std::nullopt;
    read.source.path = file->path;
    if (read.statistics) read.source.statistics_path = read.statistics->path;
    const std::size_t header = header_line(file->text);
    auto record = read_gauge_record(file->path, std::move(file->text), read.source.layout,
                                    reading.diagnostics());
    if (!record) {
        if (!read.source.layout.tip_mm) suggest_tip(reading, *entry, file->path, header);
        return std::nullopt;
    }
    read.record = *std::move(record);
    read.record.file = std::move(file->name);
    return read;
}

void refuse_no_event(const Reading& reading, const YAML::Mark& mark, const GaugeRecord& record) {
    reading.error(mark, in_quotes(record.file) + " holds no event",
                  total_depth_mm(record) > 0.0 ? "all its rain is below the threshold: lower it"
                                               : "it has no rain: check the file and its columns");
}

void refuse_steps(const ClosedMap& map, const std::string& what) {
    map.reading().error(map.mark_of(map.has("every") ? "every" : "file"),
                        what + " would have more than 10 million steps",
                        "write a longer 'every', or take less of the record");
}

}  // namespace rainledger
