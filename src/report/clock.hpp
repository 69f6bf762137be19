#pragma once

#include <chrono>
#include <span>
#include <string>

#include "rainledger/rain/hyetograph.hpp"

// Times as people read them, and the stamps of instants between a storm's edges.
namespace rainledger {

/// "2 h 05 min", to the minute.
[[nodiscard]] std::string duration_text(double hours);

/// "2:05", hours and minutes, to the minute.
[[nodiscard]] std::string elapsed_text(double hours);

/// A clock face, given as milliseconds since 1970-01-01 00:00 of that face, to the minute: "10:36",
/// or "5 Mar 02:15" on another day than that of `first_face`.
[[nodiscard]] std::string face_text(std::chrono::milliseconds face,
                                    std::chrono::milliseconds first_face);

/// The clock face at `elapsed_h` of a stamped hyetograph, to the minute: "10:36", or "5 Mar 02:15"
/// on another day than the first edge's.
[[nodiscard]] std::string clock_text(const Hyetograph& rain, double elapsed_h);

/// The instants `elapsed_h` of a stamped hyetograph as stamps, to the millisecond. Each has the UTC
/// offset of the storm's last edge at or before it.
[[nodiscard]] StampedEdges stamps_at(const Hyetograph& rain, std::span<const double> elapsed_h);

}  // namespace rainledger
