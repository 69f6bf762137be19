#include "scenario/surface_reader.hpp"

#include <algorithm>

#include "rainledger/base/cut.hpp"
#include "scenario/losses_reader.hpp"
#include "scenario/name_check.hpp"
#include "scenario/plain_text.hpp"

namespace rainledger {
namespace {

constexpr double kLargeAreaM2 = 1.0e8;      // 100 km2: beyond a site
constexpr double kSmallestAreaM2 = 1.0e-6;  // 1 mm2; ratios of areas stay finite
constexpr double kHighInterceptionMm = 25.0;
constexpr double kHighStorageMm = 100.0;

constexpr const char* kSurfacesExample =
    "write 'surfaces:' with one name per surface, such as 'parking: {area: 0.48 ha, losses: "
    "impervious}'";

void check_surface_name(const Reading& reading, const Entry& entry) {
    if (!is_name(reading, entry, "surface")) return;
    if (std::ranges::find(kReservedNames, std::string_view(entry.key)) != kReservedNames.end())
        reading.error(entry.key_mark, "a surface cannot be called '" + entry.key + "'",
                      "site, storm, storms and table have meanings of their own");
}

double read_area(const ClosedMap& map) {
    const auto area = map.required_quantity("area", Dimension::area, Least::above_zero);
    if (area && *area < kSmallestAreaM2)
        map.reading().error(map.mark_of("area"),
                            "area: '" + map.shown("area") + "' is too small to compute with",
                            "check the number and its unit");
    map.warn_above("area", area, kLargeAreaM2, "100 km2", "check the number and its unit");
    return area.value_or(0.0);
}

std::string read_drains_to(const ClosedMap& map) {
    const std::string hint = "write the name of an inlet or outfall, such as 'drains_to: CB-2'";
    const Entry* entry = map.find("drains_to");
    if (entry == nullptr) return "outlet";
    const auto place = read_text(map.reading(), *entry, hint);
    if (!place) return {};
    if (is_blank(*place))
        map.reading().error(entry->mark(), "'drains_to' is empty", hint);
    else if (place->find_first_of(",\n\r") != std::string::npos)
        map.reading().error(entry->mark(),
                            "drains_to: " + in_quotes(*place) + " holds a comma or newline", hint);
    else if (holds_hidden_characters(*place))
        map.reading().error(
            entry->mark(),
            "drains_to: " + in_quotes(*place) + " holds a character that is not shown",
            kHiddenHint);
    return *place;
}

/// Interception and depression storage. Water is ponded only where there is depression storage.
void read_stores(const ClosedMap& map, Surface& surface) {
    const auto interception = map.quantity("interception", Dimension::depth);
    map.warn_above("interception", interception, kHighInterceptionMm, "25 mm",
                   "check the number and its unit");
    const auto storage = map.quantity("depression_storage", Dimension::depth);
    map.warn_above("depression_storage", storage, kHighStorageMm, "100 mm",
                   "check the number and its unit");
    surface.interception_mm = interception.value_or(0.0);
    surface.depression_storage_mm = storage.value_or(0.0);
    if (const auto ponded = map.word("ponded_water", kPondedWater))
        surface.ponded_water = static_cast<PondedWater>(*ponded);
    const bool no_storage =
        storage ? *storage == 0.0
                : !map.has("depression_storage") && !map.is_misnamed("depression_storage");
    if (map.has("ponded_water") && no_storage)
        map.reading().warning(map.find("ponded_water")->key_mark,
                              "ponded_water changes nothing without depression_storage",
                              "add 'depression_storage: 4 mm', or take ponded_water out");
}

/// A curve number already holds the stores.
void refuse_stores(const ClosedMap& map) {
    for (const std::string_view key : {"interception", "depression_storage", "ponded_water"})
        if (const Entry* entry = map.find(key))
            map.reading().error(entry->key_mark,
                                "'" + std::string(key) + "' does not go with a curve number",
                                "its initial abstraction Ia stands for interception, depression "
                                "storage and early infiltration: take it out");
}

ReadSurface read_surface(const Reading& reading, const Entry& entry) {
    ReadSurface read;
    read.surface.name = entry.key;
    read.places.surface = reading.at(entry.key_mark);
    check_surface_name(reading, entry);
    const std::string what = "surface " + in_quotes(entry.key);
    const auto map =
        ClosedMap::read(reading, entry, what, kSurfaceKeys,
                        "write its area and losses below its name, such as '{area: 0.48 "
                        "ha, losses: impervious}'");
    if (!map) return read;
    read.surface.area_m2 = read_area(*map);
    read.surface.drains_to = read_drains_to(*map);
    bool curve_number = false;
    if (const Entry* losses = map->require("losses", "impervious")) {
        ReadLosses found = read_losses(reading, *losses, what);
        read.surface.losses = found.losses;
        read.law = reading.at(found.law);
        if (std::holds_alternative<PhiIndex>(found.losses))
            read.places.observed_excess = reading.at(found.observed_excess);
        curve_number = found.is_curve_number;
    }
    if (curve_number)
        refuse_stores(*map);
    else
        read_stores(*map, read.surface);
    if (const Entry* target = map->find("runs_onto"))
        read.runs_onto = read_runs_onto(reading, *target);
    return read;
}

/// Draining to a place named like a surface is likely meant as run-on.
void warn_drains_to_surface(const Reading& reading, const std::vector<ReadSurface>& surfaces) {
    std::vector<std::string_view> names;
    names.reserve(surfaces.size());
    for (const ReadSurface& read : surfaces)
        names.push_back(read.surface.name);
    std::ranges::sort(names);
    for (const ReadSurface& read : surfaces)
        if (std::ranges::binary_search(names, std::string_view(read.surface.drains_to)))
            reading.diagnostics().warning(
                read.places.surface,
                "surface " + in_quotes(read.surface.name) +
                    " drains to a place called like the surface " +
                    in_quotes(read.surface.drains_to),
                "to send its excess onto that surface write 'runs_onto: " +
                    cut(read.surface.drains_to) + "'");
}

}  // namespace

std::vector<ReadSurface> read_surfaces(const ClosedMap& scenario, Surfaces needed) {
    const Reading& reading = scenario.reading();
    std::vector<ReadSurface> surfaces;
    const Entry* entry = scenario.find("surfaces");
    if (entry == nullptr) {
        if (needed == Surfaces::needed && !scenario.is_misnamed("surfaces"))
            reading.error(scenario.owner_mark(), "the scenario has no surfaces", kSurfacesExample);
        return surfaces;
    }
    if (!is_map(reading, *entry, "a map of surfaces", kSurfacesExample)) return surfaces;
    for (const Entry& named : entries_of(reading, *entry, "surfaces"))
        surfaces.push_back(read_surface(reading, named));
    if (entry->value.size() == 0)
        reading.error(entry->mark(), "'surfaces' names no surface", kSurfacesExample);
    resolve_run_on(reading, surfaces);
    warn_drains_to_surface(reading, surfaces);
    return surfaces;
}

}  // namespace rainledger
