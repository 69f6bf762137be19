#include "scenario/csv_layout_reader.hpp"

#include <initializer_list>
#include <optional>
#include <string>
#include <string_view>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/unit_spellings.hpp"

namespace rainledger {
namespace {

/// A unit of one of the dimensions, kept as text for the CSV reader.
std::optional<std::string> read_unit(const ClosedMap& map, std::string_view key,
                                     std::initializer_list<Dimension> dimensions,
                                     const std::string& hint) {
    const auto name = map.text(key, hint);
    if (!name) return std::nullopt;
    for (const Dimension dimension : dimensions)
        if (find_unit(*name, dimension)) return name;
    std::optional<std::string> meant;
    for (const Dimension dimension : dimensions)
        if (!meant) meant = meant_unit(*name, dimension);
    map.reading().error(map.mark_of(key),
                        std::string(key) + ": " + in_quotes(*name) + " is not a unit here",
                        meant ? "did you mean '" + *meant + "'?" : hint);
    return std::nullopt;
}

/// Whether the unit and the kind of the rain column speak of the same thing.
void check_unit_and_kind(const ClosedMap& map, const CsvLayout& layout) {
    if (!layout.rain_unit || !layout.kind) return;
    const bool rate = find_unit(*layout.rain_unit, Dimension::rate).has_value();
    const bool intensity = *layout.kind == RainKind::intensity;
    if (rate == intensity) return;
    map.reading().error(map.mark_of("unit"),
                        "unit: " + in_quotes(*layout.rain_unit) +
                            " does not go with 'kind: " + map.shown("kind") + "'",
                        intensity ? "an intensity takes a unit such as 'mm/h'"
                                  : "a depth takes a unit such as 'mm'");
}

void read_zone(const ClosedMap& map, CsvLayout& layout) {
    const std::string hint = "write a zone by its place, such as 'Europe/Madrid'";
    const auto zone = map.text("zone", hint);
    if (!zone) return;
    if (is_known_zone(*zone))
        layout.zone = zone;
    else
        map.reading().error(map.mark_of("zone"),
                            "zone: " + in_quotes(*zone) + " is not in the time zone database",
                            hint);
}

/// The meanings of the columns. For a wrong word, which is reported, one that can stand in its
/// place lets the rows be looked at.
void read_kind_and_stamp(const ClosedMap& map, CsvLayout& layout) {
    if (const auto kind = map.word("kind", kRainKinds))
        layout.kind = static_cast<RainKind>(*kind);
    else if (map.has("kind") && layout.rain_unit)
        layout.kind =
            find_unit(*layout.rain_unit, Dimension::rate) ? RainKind::intensity : RainKind::depth;
    if (const auto stamp = map.word("stamp", kStamps))
        layout.stamp = static_cast<StampMeaning>(*stamp);
    else if (map.has("stamp"))
        layout.stamp = StampMeaning::end;
}

}  // namespace

CsvLayout read_csv_layout(const ClosedMap& map) {
    CsvLayout layout;
    layout.time_column = map.text("time", "write the header of the time column");
    layout.rain_column = map.text("rain", "write the header of the rain column");
    layout.rain_unit = read_unit(map, "unit", {Dimension::depth, Dimension::rate},
                                 "write a unit such as 'mm', 'in', 'mm/h' or 'in/h'");
    layout.time_unit =
        read_unit(map, "time_unit", {Dimension::time}, "write a unit such as 's', 'min' or 'h'");
    read_kind_and_stamp(map, layout);
    read_zone(map, layout);
    layout.gaps_are_dry = map.word("gaps", kGaps).has_value();
    layout.missing = map.text("missing", "write the text that marks a missing value, such as -999");
    check_unit_and_kind(map, layout);
    return layout;
}

}  // namespace rainledger
