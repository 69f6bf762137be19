#include <algorithm>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "scenario/plain_text.hpp"
#include "scenario/yaml.hpp"

namespace rainledger {
namespace {

/// "'a', 'b' or 'c'".
std::string choice_of(Words keys) {
    std::string out;
    for (std::size_t i = 0; i < keys.size(); ++i)
        out += (i == 0 ? "" : i + 1 == keys.size() ? " or " : ", ") + in_quotes(keys[i]);
    return out;
}

}  // namespace

std::optional<ClosedMap> ClosedMap::read(const Reading& reading, const Entry& owner,
                                         std::string what, Words keys, const std::string& hint) {
    if (!is_map(reading, owner, "a map", hint)) return std::nullopt;
    ClosedMap map(reading, owner, std::move(what));
    for (Entry& entry : entries_of(reading, owner, map.what_)) {
        if (std::ranges::find(keys, std::string_view(entry.key)) != keys.end())
            map.entries_.push_back(std::move(entry));
        else
            map.refuse_key(entry, keys);
    }
    return map;
}

void ClosedMap::refuse_key(const Entry& entry, Words keys) {
    const auto apart = with_blank_after_colon(entry.key);
    const auto lone = entry.value.IsNull() ? hint_for_lone_key(entry.key) : std::nullopt;
    reading_->error(entry.key_mark, "unknown key " + in_quotes(entry.key) + " in " + what_,
                    lone ? *lone : way_out(entry.key, keys));
    const std::string key = entry.key.substr(0, apart ? entry.key.find(':') : std::string::npos);
    if (std::ranges::find(keys, std::string_view(key)) != keys.end())
        misnamed_.push_back(key);
    else if (const auto meant = probably_meant(key, keys))
        misnamed_.emplace_back(*meant);
}

const Entry* ClosedMap::find(std::string_view key) const {
    const auto found = std::ranges::find(entries_, key, &Entry::key);
    return found == entries_.end() ? nullptr : &*found;
}

bool ClosedMap::is_misnamed(std::string_view key) const {
    return std::ranges::find(misnamed_, key) != misnamed_.end();
}

std::string ClosedMap::shown(std::string_view key) const {
    const Entry* entry = find(key);
    return entry != nullptr && entry->value.IsScalar() ? cut(entry->value.Scalar()) : std::string{};
}

const Entry* ClosedMap::require(std::string_view key, std::string_view example) const {
    const Entry* entry = find(key);
    if (entry == nullptr && !is_misnamed(key))
        reading_->error(owner_mark_, "'" + std::string(key) + "' is missing from " + what_,
                        "add '" + std::string(key) + ": " + std::string(example) + "'");
    return entry;
}

const Entry* ClosedMap::exactly_one(Words keys, const std::string& none,
                                    const std::string& none_hint,
                                    const std::string& several_hint) const {
    const Entry* only = nullptr;
    bool misnamed = false;
    for (const std::string_view key : keys) {
        misnamed = misnamed || is_misnamed(key);
        const Entry* entry = find(key);
        if (entry != nullptr && only != nullptr) {
            reading_->error(entry->key_mark,
                            what_ + " takes one of " + choice_of(keys) +
                                (keys.size() == 2 ? ", not both" : ", not several"),
                            several_hint);
            return nullptr;
        }
        if (entry != nullptr) only = entry;
    }
    if (only == nullptr && !misnamed) reading_->error(owner_mark_, none, none_hint);
    return only;
}

std::optional<double> ClosedMap::quantity(std::string_view key, Dimension dimension,
                                          Least least) const {
    const Entry* entry = find(key);
    if (entry == nullptr) return std::nullopt;
    return read_quantity(*reading_, *entry, dimension, least);
}

std::optional<double> ClosedMap::required_quantity(std::string_view key, Dimension dimension,
                                                   Least least) const {
    const Entry* entry = require(key, example_quantity(dimension));
    if (entry == nullptr) return std::nullopt;
    return read_quantity(*reading_, *entry, dimension, least);
}

std::optional<double> ClosedMap::fraction(std::string_view key) const {
    const Entry* entry = find(key);
    if (entry == nullptr) return std::nullopt;
    return read_fraction(*reading_, *entry);
}

std::optional<std::size_t> ClosedMap::word(std::string_view key, Words words) const {
    const Entry* entry = find(key);
    if (entry == nullptr) return std::nullopt;
    return read_word(*reading_, *entry, words);
}

std::optional<std::string> ClosedMap::text(std::string_view key, const std::string& hint) const {
    const Entry* entry = find(key);
    if (entry == nullptr) return std::nullopt;
    return read_text(*reading_, *entry, hint);
}

void ClosedMap::warn_above(std::string_view key, const std::optional<double>& value, double most,
                           const std::string& limit, const std::string& hint) const {
    if (!value || *value <= most) return;
    reading_->warning(mark_of(key), std::string(key) + " is " + shown(key) + ", above " + limit,
                      hint);
}

}  // namespace rainledger
