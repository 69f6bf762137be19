#include "rainledger/ledger/surface.hpp"
